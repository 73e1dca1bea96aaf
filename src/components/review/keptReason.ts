import type { ReviewAct } from './words';

/** A reason that is being written, and where it belongs. */
export interface Written {
  act: ReviewAct;
  /** `step:<id>`, the path of a value, or empty for the whole. */
  anchor: string;
  text: string;
}

/** What was written before: `open` as long as its panel was not closed. */
export interface Kept extends Written {
  act: 'return' | 'decline';
  open: boolean;
}

const key = (id: string) => `review.${id}`;

/**
 * Keeps what is being written for as long as the tab is open, so that neither closing its panel nor loading the page
 * again loses it.
 */
export function keepReason(id: string, written: Written | null, open = true): void {
  try {
    // Publishing asks for no reason: what was typed before it was chosen is kept for a return.
    const act = written?.act === 'decline' ? 'decline' : 'return';
    if (written?.text.trim()) sessionStorage.setItem(key(id), JSON.stringify({ ...written, act, open }));
    else sessionStorage.removeItem(key(id));
  } catch {
    // Storage may be full or forbidden; the text still stands in the field.
  }
}

export function keptReason(id: string): Kept | null {
  try {
    const kept = JSON.parse(sessionStorage.getItem(key(id)) ?? 'null') as Partial<Kept> | null;
    const { act, anchor, text, open } = kept ?? {};
    if ((act !== 'return' && act !== 'decline') || typeof text !== 'string') return null;
    return { act, text, anchor: typeof anchor === 'string' ? anchor : '', open: open !== false };
  } catch {
    return null;
  }
}
