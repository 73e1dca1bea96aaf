/** Hashes of canonical texts of one procedure; null where there is none. */
export interface ReleaseFacts {
  /** What this release ships. */
  shipped: string;
  /** What the release before it shipped. */
  before: string | null;
  /** What is published now. */
  current: string | null;
}

/**
 * What becomes of a text that a release ships: a new procedure; nothing, where the book has it or has
 * moved on from it; the next revision, where the book still stood at the last release; else a proposal,
 * because the book's own changes are somebody's and are not overwritten.
 */
export function releaseStep({ shipped, before, current }: ReleaseFacts): 'add' | 'none' | 'revise' | 'propose' {
  if (current === null) return 'add';
  if (shipped === current || shipped === before) return 'none';
  return before === current ? 'revise' : 'propose';
}
