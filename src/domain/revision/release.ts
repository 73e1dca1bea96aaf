/** Hashes of canonical texts of one procedure; null where there is none. */
export interface ReleaseFacts {
  /** What this release ships. */
  shipped: string;
  /** What the release before it shipped. */
  before: string | null;
  /** What is published now. */
  current: string | null;
  /** A torque of it fails the clamp check, and would be new or changed. */
  fails: boolean;
}

/**
 * What becomes of a text that a release ships: a new procedure; nothing, where the book has it or has
 * moved on from it; the next revision, where the book still stood at the last release; else a proposal,
 * because the book's own changes are somebody's and are not overwritten.
 *
 * What a release publishes, nobody reviews. So a torque past proof load, which an editor must override with a reason,
 * never enters that way: a new procedure with one is left out, for nobody works to it yet and the file can be mended; a
 * revision becomes a proposal, where an editor judges it and the sheet that is in use stays until then.
 */
export function releaseStep({
  shipped,
  before,
  current,
  fails,
}: ReleaseFacts): 'add' | 'refuse' | 'none' | 'revise' | 'propose' {
  if (current === null) return fails ? 'refuse' : 'add';
  if (shipped === current || shipped === before) return 'none';
  return before === current && !fails ? 'revise' : 'propose';
}
