/**
 * Characters that have no place in a sheet: control characters, halves of surrogate pairs, and the
 * marks that turn the direction of writing, with which "10" can be made to read as "01"
 * (CVE-2021-42574 shows the trick on program text).
 */
const FORBIDDEN: readonly { what: string; pattern: RegExp }[] = [
  { what: 'a control character', pattern: /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f]/ },
  { what: 'a mark that turns the direction of writing', pattern: /[\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]/ },
  { what: 'a broken character', pattern: /\p{Surrogate}/u },
  { what: 'a separator that no keyboard writes', pattern: /[\u2028\u2029\ufeff\ufffe\uffff\ufff9-\ufffb]/ },
];

/** The first forbidden character of `text` as `{index, what}`, or null. */
export function forbiddenCharacter(text: string): { index: number; what: string } | null {
  let first: { index: number; what: string } | null = null;
  for (const { what, pattern } of FORBIDDEN) {
    const index = text.search(pattern);
    if (index >= 0 && (first === null || index < first.index)) first = { index, what };
  }
  return first;
}

/** Whether a name or the like is one line of plain text, which reads as it is stored. */
export const isOneLine = (text: string): boolean => !/[\t\n\r]/.test(text) && forbiddenCharacter(text) === null;

export const NOT_ONE_LINE = 'Use letters and signs of a single line only.';

export const forbiddenSentence = (what: string) => `There is ${what} here. Delete it and type the place again.`;

/** The text without what has no place in a sheet. */
export const withoutForbidden = (text: string): string =>
  FORBIDDEN.reduce((rest, { pattern }) => rest.replace(new RegExp(pattern.source, `${pattern.flags}g`), ''), text);
