/** Raised and lowered figures are words of their own: "10²" is not "102". */
const OFF_LINE = /[⁰¹²³⁴-⁹₀-₉]+/gu;

/** The words of a text, for seeing to it that none is lost: runs of letters and digits, in one spelling of each letter. */
export const countedWords = (text: string): string[] =>
  text
    .replace(/[\p{Cf}\p{Cc}\p{Cs}]/gu, (sign) => (/\s/.test(sign) ? ' ' : ''))
    .replace(OFF_LINE, ' $& ')
    .normalize('NFKC')
    .match(/[\p{L}\p{M}\p{N}]+/gu) ?? [];

/** The words of `source` that `taken` does not hold, in either case, each as often as it is missing, in their order. */
export function wordsMissing(source: string, taken: string): string[] {
  const left = new Map<string, number>();
  const same = (word: string) => word.toLowerCase();
  for (const word of countedWords(taken).map(same)) left.set(word, (left.get(word) ?? 0) + 1);
  return countedWords(source).filter((word) => {
    const count = left.get(same(word)) ?? 0;
    left.set(same(word), count - 1);
    return count <= 0;
  });
}
