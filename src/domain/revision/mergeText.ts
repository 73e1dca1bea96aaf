import { diff3Merge } from 'node-diff3';
import type { Side } from './mergeTypes';

type Chunk = { ok: string[] } | { conflict: { a: string[]; o: string[]; b: string[] } };

/** Three-way merge of sequences of lines or keys, as pieces in order. What both sides did alike is no conflict. */
export const chunksOf = (base: readonly string[], mine: readonly string[], theirs: readonly string[]): Chunk[] =>
  diff3Merge([...mine], [...base], [...theirs], { excludeFalseConflicts: true }) as Chunk[];

/** The sequence where nothing in it conflicts, else null. */
export function mergedSequence(
  base: readonly string[],
  mine: readonly string[],
  theirs: readonly string[],
): string[] | null {
  const chunks = chunksOf(base, mine, theirs);
  return chunks.every((chunk) => 'ok' in chunk) ? chunks.flatMap((chunk) => ('ok' in chunk ? chunk.ok : [])) : null;
}

/**
 * Words of both, paragraph by paragraph as canonical text has them on lines. Where some conflict, the text for each
 * side: its own words there, and everywhere else the clean edits of both, so that to choose one loses none of them.
 */
export function mergeText(
  base: string,
  mine: string,
  theirs: string,
): { text: string } | { sides: Record<Side, string> } {
  if (mine === theirs || base === theirs) return { text: mine };
  if (base === mine) return { text: theirs };
  const chunks = chunksOf(base.split('\n'), mine.split('\n'), theirs.split('\n'));
  const textFor = (part: 'a' | 'o' | 'b') =>
    chunks.flatMap((chunk) => ('ok' in chunk ? chunk.ok : chunk.conflict[part])).join('\n');
  if (chunks.every((chunk) => 'ok' in chunk)) return { text: textFor('o') };
  return { sides: { base: textFor('o'), mine: textFor('a'), theirs: textFor('b') } };
}
