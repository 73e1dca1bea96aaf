import type { SourceProblem } from './types';

/** As many as a person can act on; a hostile text must not answer with a million of them. */
export const MOST_SHOWN = 50;

/** A place in the text; unified gives it on every node. Lines and columns count from 1. */
export interface Place {
  line: number;
  column: number;
}

/** Where the value at a path stands in the text; for a missing one, where its parent stands. */
export type PlaceOf = (path: readonly (string | number)[], part?: 'value' | 'name') => Place;

export const START: Place = { line: 1, column: 1 };

export function problem(place: Place | undefined, message: string, path?: string): SourceProblem {
  const { line, column } = place ?? START;
  return path === undefined ? { line, column, message } : { line, column, message, path };
}

/** In reading order, without repeats, no more than can be shown. */
export function inOrder(problems: SourceProblem[]): SourceProblem[] {
  const seen = new Set<string>();
  return problems
    .filter((p) => {
      const same = `${p.line}:${p.column}:${p.message}`;
      return seen.has(same) ? false : seen.add(same);
    })
    .sort((a, b) => a.line - b.line || a.column - b.column)
    .slice(0, MOST_SHOWN);
}
