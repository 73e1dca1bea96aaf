import type { Phrases } from './phrases';
import { fold, saysNothing, wordRuns } from './words';

/** The token that stands for a vocabulary group. No word can look like it. */
export const groupToken = (group: number): string => `~${group}`;
export const isGroupToken = (token: string): boolean => token.startsWith('~');

/**
 * Turns text into what is searched: each word, folded, and a token for each name the trade has other words for. So
 * "rocker cover" in a query and "valve cover" on a sheet meet in one token, whichever of the two was written.
 */
export function tokensIn(text: string, phrases: Phrases): string[] {
  const tokens: string[] = [];
  for (const run of wordRuns(text)) {
    const folded = run.map((word) => fold(word.text));
    folded.forEach((word, at) => {
      if (!saysNothing(word)) tokens.push(word);
      for (const { groups } of phrases.startingAt(folded, at))
        for (const group of groups) tokens.push(groupToken(group));
    });
  }
  return tokens;
}
