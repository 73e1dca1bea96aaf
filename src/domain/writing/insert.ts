/** A text with a caret or a selection in it. */
export interface Caret {
  text: string;
  start: number;
  end: number;
}

/** What goes in, and which part of it is selected afterwards, so that typing replaces it. */
export interface Piece {
  text: string;
  /** Among words, or in a paragraph of its own. */
  stands: 'sentence' | 'block';
  select?: string;
}

/** Text to put in place of the selection, and the selection after it. */
export interface Insertion {
  replacement: string;
  start: number;
  end: number;
}

/** Blank lines needed between `before` and a paragraph of its own. */
const gapAfter = (before: string) =>
  before.trim() === '' ? '' : before.endsWith('\n\n') ? '' : before.endsWith('\n') ? '\n' : '\n\n';
const gapBefore = (after: string) =>
  after.trim() === '' ? '' : after.startsWith('\n\n') ? '' : after.startsWith('\n') ? '\n' : '\n\n';

/**
 * Puts a component where the caret stands. In a sentence a blank is added where it would touch a word; a block gets
 * a paragraph of its own, and the words behind the caret go on in the next one.
 */
export function insertAt({ text, start, end }: Caret, piece: Piece): Insertion {
  const before = text.slice(0, start);
  const after = text.slice(end);
  const block = piece.stands === 'block';
  const left = block ? gapAfter(before.replace(/[ \t]+$/, '')) : /[^\s(“"'‘/-]$/.test(before) ? ' ' : '';
  const right = block ? gapBefore(after.replace(/^[ \t]+/, '')) : /^[\p{L}\p{N}(]/u.test(after) ? ' ' : '';
  const at = start + left.length;
  const inside = piece.select ? piece.text.indexOf(piece.select) : -1;
  const from = inside >= 0 ? at + inside : at + piece.text.length + (block ? 0 : right.length);
  return {
    replacement: `${left}${piece.text}${right}`,
    start: from,
    end: inside >= 0 ? from + (piece.select?.length ?? 0) : from,
  };
}

/** The text once the insertion is made. */
export const inserted = ({ text, start, end }: Caret, { replacement }: Insertion): string =>
  `${text.slice(0, start)}${replacement}${text.slice(end)}`;
