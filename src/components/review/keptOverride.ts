const key = (id: string, torque: string) => `review.${id}.override.${torque}`;

/** Keeps the reason of an override while it is being written, for as long as the tab is open; blanks are not kept. */
export function keepOverride(id: string, torque: string, text: string): void {
  try {
    if (text.trim()) sessionStorage.setItem(key(id, torque), text);
    else sessionStorage.removeItem(key(id, torque));
  } catch {
    // Storage may be full or forbidden; the text still stands in the field.
  }
}

export function keptOverride(id: string, torque: string): string {
  try {
    return sessionStorage.getItem(key(id, torque)) ?? '';
  } catch {
    return '';
  }
}
