/**
 * Which versions of a draft are kept. Every save makes one; those of one sitting are thinned, so that there is something to
 * go back to from each few minutes of writing and nothing from each few words.
 */

export const VERSION_KINDS = ['start', 'write', 'submit', 'return', 'restore', 'merge', 'suggestion', 'aside'] as const;
/**
 * How a version came to be. `write`: saved while it was written. `restore`: gone back to an earlier one. `merge`: put on
 * another revision. `aside`: words that were never the draft's, because those of another tab were taken.
 */
export type VersionKind = (typeof VERSION_KINDS)[number];

export interface Version {
  /** Rises by one from version to version of a draft; the first is 1. */
  n: number;
  kind: VersionKind;
  /** ISO 8601 in UTC. */
  at: string;
  /** When the sitting that it belongs to began. */
  sittingAt: string;
  /** Which page it was written on; null where the writer did not say. */
  page: string | null;
}

const MINUTE = 60_000;
/** After so long without a save, the next one begins another sitting. */
export const SITTING_GAP = 30 * MINUTE;
/** Of a sitting, one version is kept for each of these. */
export const SPACING = 5 * MINUTE;
export const MOST_VERSIONS = 100;

const after = (from: string, to: string) => Date.parse(to) - Date.parse(from);

/** When the sitting began that a save made now on `page` belongs to. Two pages that save in turn sit apart. */
export function sittingOf(last: Version | undefined, at: string, page: string | null): string {
  const goesOn = last?.kind === 'write' && last.page === page && after(last.at, at) <= SITTING_GAP;
  return goesOn ? last.sittingAt : at;
}

/** Versions of one sitting that share this are so near each other that the last of them stands for all. */
const spell = ({ sittingAt, page, at }: Version) =>
  `${sittingAt} ${page ?? ''} ${Math.floor(after(sittingAt, at) / SPACING)}`;

/**
 * The numbers of versions to let go. Kept are the first and the last one, what is no mere save, the one before that, the
 * first of each sitting, and one for each five minutes of it. Of more than `most` the oldest go, but never the first, the
 * last and what was sent in.
 *
 * @param versions in the order of their numbers
 */
export function thinnedOut(versions: readonly Version[], most = MOST_VERSIONS): number[] {
  const kept = versions.filter((version, i) => {
    const next = versions[i + 1];
    if (i === 0 || !next || version.kind !== 'write' || next.kind !== 'write') return true;
    return version.at === version.sittingAt || spell(version) !== spell(next);
  });
  const tooMany = Math.max(0, kept.length - most);
  const oldest = kept
    .slice(1, -1)
    .filter(({ kind }) => kind !== 'submit')
    .slice(0, tooMany);
  const stay = new Set(kept);
  for (const version of oldest) stay.delete(version);
  return versions.filter((version) => !stay.has(version)).map(({ n }) => n);
}
