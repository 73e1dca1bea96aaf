import type { ReviewAct } from './words';

/** A reason that is being written, and where it belongs. */
export interface Written {
  act: ReviewAct;
  /** `step:<id>`, the path of a value, or empty for the whole. */
  anchor: string;
  text: string;
}

const key = (id: string) => `review.${id}`;

/** Keeps what is being written for as long as the tab is open, so that loading the page again loses nothing. */
export function keepReason(id: string, written: Written | null): void {
  try {
    if (written?.text.trim()) sessionStorage.setItem(key(id), JSON.stringify(written));
    else sessionStorage.removeItem(key(id));
  } catch {
    // Storage may be full or forbidden; the text still stands in the field.
  }
}

export function keptReason(id: string): Written | null {
  try {
    const kept = JSON.parse(sessionStorage.getItem(key(id)) ?? 'null') as Partial<Written> | null;
    const { act, anchor, text } = kept ?? {};
    if ((act !== 'return' && act !== 'decline') || typeof text !== 'string') return null;
    return { act, text, anchor: typeof anchor === 'string' ? anchor : '' };
  } catch {
    return null;
  }
}
