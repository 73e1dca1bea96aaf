/** Words of a text, with the places they stand at, so that what matched can be marked. */
export interface Word {
  /** Small letters without accents; digits keep their point: "m6", "1.5", "4102". */
  text: string;
  start: number;
  end: number;
}

/** A part number is its letters and its digits, so that "TN-4102", "TN 4102" and "tn4102" are the same two words. */
const WORD = /\d+(?:[.,]\d+)+|\p{L}{1,4}(?=\d{3})|[\p{L}\p{N}]+(?:['’]s\b)?/gu;
/** The same for plain letters, which is most text and reads several times faster. */
const PLAIN_WORD = /\d+(?:[.,]\d+)+|[a-z]{1,4}(?=\d{3})|[a-z0-9]+(?:'s\b)?/g;
const isPlain = (text: string): boolean => !/[^\x20-\x7e]/.test(text);

/** Small letters without accents. Keeps the length of the text, so that places in one are places in the other. */
export function plain(text: string): string {
  const small = text.toLowerCase();
  if (isPlain(text)) return small;
  const folded = small.normalize('NFD').replace(/\p{M}+/gu, '');
  if (folded.length === text.length) return folded;
  return small.length === text.length ? small : text;
}

export function wordsOf(text: string): Word[] {
  const words: Word[] = [];
  for (const match of plain(text).matchAll(isPlain(text) ? PLAIN_WORD : WORD)) {
    const [word] = match;
    const start = match.index;
    const cut = /^\d/.test(word) ? word.replace(',', '.') : word.replace(/['’]s$/, '');
    words.push({ text: cut, start, end: start + word.length });
  }
  return words;
}

/** Words that stand together, cut where the text pauses: "cam, cover" names no cam cover. */
export function wordRuns(text: string): Word[][] {
  const runs: Word[][] = [];
  let end = -1;
  for (const word of wordsOf(text)) {
    const run = runs.at(-1);
    if (run && !/[,;:.()!?]/.test(text.slice(end, word.start))) run.push(word);
    else runs.push([word]);
    end = word.end;
  }
  return runs;
}

/**
 * One form for singular and plural. Only plurals: cutting more would break a search while the word is being
 * typed, because "timin" does not begin with the stem of "timing".
 */
export function fold(word: string): string {
  if (word.length < 4 || !word.endsWith('s') || /(ss|us|is)$/.test(word)) return word;
  if (word.endsWith('ies') && word.length > 4) return `${word.slice(0, -3)}y`;
  if (/(sh|ch|x|z|ss)es$/.test(word)) return word.slice(0, -2);
  return word.slice(0, -1);
}

/** What is left of a word without the ending that makes it another part of speech; null where nothing sensible is. */
export function stemOf(word: string): string | null {
  const match = /^(.{3,}?)(ing|ed|al|ation|ment|er|or|e)$/.exec(word);
  const stem = match?.[1];
  if (!stem) return null;
  return /([bdgmnprt])\1$/.test(stem) ? stem.slice(0, -1) : stem;
}

/** Words that say nothing about which sheet is meant. */
const EMPTY_WORDS = new Set(
  'a an and are at be by can do does for from how i if in into is it its my of on or our so than that the their them then there these this to under up what when where which with you your'.split(
    ' ',
  ),
);

export const saysNothing = (word: string): boolean => EMPTY_WORDS.has(word);
