import { changeWords, draftChanges } from './changes';
import { readDraft } from './readDraft';

/** What an author writes: the text and the reason. */
export interface Words {
  source: string;
  reason: string;
}

/** How many lines of either text the other one has not. */
function linesApart(from: string, to: string): number {
  const left = new Map<string, number>();
  for (const line of from.split('\n')) left.set(line, (left.get(line) ?? 0) + 1);
  let added = 0;
  for (const line of to.split('\n')) {
    const known = left.get(line) ?? 0;
    if (known > 0) left.set(line, known - 1);
    else added += 1;
  }
  const removed = [...left.values()].reduce((sum, n) => sum + n, 0);
  return Math.max(added, removed);
}

/**
 * What was changed from one text to another, in words: steps and values by name where both can be shown in the form, else
 * the number of lines. Empty where they say the same.
 */
export function textChanges(from: Words, to: Words): string[] {
  const reason = from.reason === to.reason ? [] : ['reason changed'];
  if (from.source === to.source) return reason;
  const [before, after] = [readDraft(from.source, from.reason), readDraft(to.source, to.reason)];
  if (before && after) return changeWords(draftChanges(before, after));
  const lines = linesApart(from.source, to.source);
  return [lines === 1 ? '1 line of the text' : `${lines} lines of the text`, ...reason];
}
