import { breaksAt } from '@/domain/audit/chain';
import type { Fault } from '@/domain/audit/fault';
import { app } from '../context';
import { entryHash } from './append';
import { knownTrail, unlike } from './known';
import { spokenFaults, unspokenFaults } from './records/all';
import { textFaultsOf } from './records/texts';
import { named, type StoredEntry } from './walk';

/** How the history of one procedure stands, looked at now. */
export interface TrailStanding {
  /** Of the whole trail, each followed from the one before it. */
  entries: number;
  /** When the trail was last followed from its first entry. */
  wholeAt: string;
  /** Of the entries about what is shown. */
  own: number;
  /** What is wrong with what is shown. */
  faults: Fault[];
  /** Something else in the trail is wrong. */
  elsewhere: boolean;
  /** Something is gone of which nobody can say what it was about. */
  unplaced: boolean;
}

/** Entries about a few subjects, each with the hash of the one before it as that stands now. */
const OWN = `SELECT e.seq, e.at, e.actorId, e.act, e.subjectType, e.subjectId, e.shopId, e.detail, e.previousHash, e.hash,
    (SELECT hash FROM auditEntries WHERE seq = e.seq - 1) AS before,
    (SELECT previousHash FROM auditEntries WHERE seq = e.seq + 1) AS after
  FROM auditEntries e WHERE e.subjectId IN (:ids) ORDER BY e.seq`;

/**
 * Looks at what a page of history shows: the trail since the last look, the entries about these revisions, the rows they
 * speak of, and that each text gives its hash. Costs the same however long the trail is.
 */
export async function standingOf(
  procedure: { id: string; number: string },
  revisionIds: readonly string[],
): Promise<TrailStanding> {
  const { db } = await app();
  const { end, faults: known, wholeAt } = await knownTrail();
  const ids = [procedure.id, ...revisionIds];
  const entries = await db.read<StoredEntry & { before: string | null; after: string | null }>(OWN, { ids });
  const breaks = entries.flatMap((entry) => {
    const before = { seq: entry.seq - 1, hash: entry.before ?? '' };
    const replaced = entry.after !== null && entry.after !== entry.hash && entryHash(entry) === entry.hash;
    return [
      ...breaksAt(before, entry, entryHash(entry)),
      ...(replaced ? [{ kind: 'replaced', seq: entry.seq } as const] : []),
    ];
  });
  const about = (fault: Fault) => fault.number === procedure.number;
  const own = [
    ...(await named(breaks)).filter(about),
    ...(await spokenFaults('e.subjectId IN (:ids)', { ids })),
    ...(await unspokenFaults('r.procedureId = :procedureId', { procedureId: procedure.id })),
    ...(await textFaultsOf(revisionIds)),
  ];
  const faults = unlike([...known.filter(about), ...own]);
  return {
    entries: end.seq,
    wholeAt,
    own: entries.length,
    faults,
    elsewhere: known.some((fault) => !about(fault)),
    unplaced: known.some(({ number }) => number === null),
  };
}
