import type { Phrases } from './phrases';
import { fold, saysNothing, wordRuns } from './words';

/** The token that stands for a vocabulary group. No word can look like it. */
export const groupToken = (group: number): string => `~${group}`;
export const isGroupToken = (token: string): boolean => token.startsWith('~');

/**
 * Turns text into what is searched: each word, folded, and a token for each name the trade has other words for. So
 * "rocker cover" in a query and "valve cover" on a sheet meet in one token, whichever of the two was written.
 */
export function createTokens(phrases: Phrases): (text: string) => readonly string[] {
  const known = new Map<string, readonly string[]>();
  const read = (text: string): readonly string[] => {
    const tokens: string[] = [];
    for (const run of wordRuns(text)) {
      const folded = run.map((word) => fold(word.text));
      folded.forEach((word, at) => {
        if (!saysNothing(word)) tokens.push(word);
        for (const { groups } of phrases.startingAt(folded, at)) tokens.push(...groups.map(groupToken));
      });
    }
    return tokens;
  };
  // Names of parts, tools and steps come back in many sheets; each is read once.
  return (text) => {
    const before = known.get(text);
    if (before) return before;
    const tokens = read(text);
    known.set(text, tokens);
    return tokens;
  };
}
