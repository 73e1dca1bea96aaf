/**
 * The words of a text for comparing two of them: runs of letters and digits, small. Written apart from the code that is
 * tested with it, so that neither can hide a mistake of the other.
 */
export const bagOf = (text: string): Map<string, number> => {
  const bag = new Map<string, number>();
  for (const word of text.toLowerCase().split(/[^\p{L}\p{N}]+/u)) if (word) bag.set(word, (bag.get(word) ?? 0) + 1);
  return bag;
};

/** The words of one text that another holds less often. */
export function lost(source: string, kept: string): string[] {
  const has = bagOf(kept);
  return [...bagOf(source)].flatMap(([word, count]) => ((has.get(word) ?? 0) < count ? [word] : []));
}
