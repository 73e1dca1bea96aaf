/** The chain of the audit trail: each entry names the hash of the one before it. Pure; the hashes are worked out by the caller. */

/** An entry that is known to follow from the first one on. */
export interface Link {
  /** 0 before the first entry. */
  seq: number;
  /** Empty before the first entry. */
  hash: string;
}
export const BEFORE_THE_FIRST: Link = { seq: 0, hash: '' };

export interface ChainedLink extends Link {
  previousHash: string;
}

export type Break =
  /** Its words do not give the hash that stands beside them. */
  | { kind: 'changed'; seq: number }
  /** It and its hash were made anew: the entry after it still names the hash that it had. */
  | { kind: 'replaced'; seq: number }
  /** Numbers are given one by one and never again, so a gap is entries taken out: from `seq` through `through`. */
  | { kind: 'missing'; seq: number; through: number };

/**
 * How an entry follows from the one before it.
 *
 * @param hashed what the words of `entry` and its `previousHash` give
 */
export function breaksAt(before: Link, entry: ChainedLink, hashed: string): Break[] {
  const gap = entry.seq - before.seq - 1;
  const missing: Break[] = gap > 0 ? [{ kind: 'missing', seq: before.seq + 1, through: entry.seq - 1 }] : [];
  if (hashed !== entry.hash) return [...missing, { kind: 'changed', seq: entry.seq }];
  if (gap > 0 || entry.previousHash === before.hash) return missing;
  // Its own hash holds the one it names, so it is as it was written; the one before it is not.
  return [before.seq === 0 ? { kind: 'changed', seq: entry.seq } : { kind: 'replaced', seq: before.seq }];
}
