import { BEFORE_THE_FIRST, breaksAt, type Break, type Link } from '@/domain/audit/chain';
import { breakFault, type Fault } from '@/domain/audit/fault';
import { app } from '../context';
import { entryHash, type ChainedEntry } from './append';

export interface StoredEntry extends ChainedEntry {
  seq: number;
  hash: string;
}

const COLUMNS = 'seq, at, actorId, act, subjectType, subjectId, shopId, detail, previousHash, hash';
/** Enough to keep the database busy, and few enough that nobody who reads a sheet waits. */
const AT_A_TIME = 500;

/** The trail behind `seq` in its order, some entries at a time, as they are stored. */
export async function* entriesAfter(seq: number): AsyncGenerator<StoredEntry[]> {
  const { db } = await app();
  for (let after = seq; ;) {
    const rows = await db.read<StoredEntry>(
      `SELECT ${COLUMNS} FROM auditEntries WHERE seq > :after ORDER BY seq LIMIT ${AT_A_TIME}`,
      { after },
    );
    const last = rows.at(-1);
    if (!last) return;
    yield rows;
    after = last.seq;
  }
}

interface About {
  seq: number;
  at: string;
  detail: string;
  number: string | null;
  letter: string | null;
}

/** What the entries are about, by the rows that they name; where those are gone, by the entry's own words. */
async function about(seqs: readonly number[]): Promise<Map<number, Pick<Fault, 'at' | 'number' | 'letter'>>> {
  const { db } = await app();
  const rows = await db.read<About>(
    `SELECT e.seq, e.at, e.detail, coalesce(p.number, q.number, (SELECT number FROM procedures WHERE id = b.procedureId)) AS number,
       coalesce(r.letter, (SELECT letter FROM revisions WHERE id = b.revisionId)) AS letter
     FROM auditEntries e LEFT JOIN revisions r ON r.id = e.subjectId LEFT JOIN procedures p ON p.id = r.procedureId
     LEFT JOIN procedures q ON q.id = e.subjectId LEFT JOIN bulletins b ON b.id = e.subjectId
     WHERE e.seq IN (:seqs)`,
    { seqs },
  );
  return new Map(
    rows.map(({ seq, at, detail, number, letter }) => {
      const told = JSON.parse(detail) as { number?: unknown; letter?: unknown };
      const named = (value: unknown) => (typeof value === 'string' ? value : null);
      return [seq, { at, number: number ?? named(told.number), letter: letter ?? named(told.letter) }];
    }),
  );
}

/** Breaks of the chain as faults that name what the entry is about. */
export async function named(breaks: readonly Break[]): Promise<Fault[]> {
  if (breaks.length === 0) return [];
  const known = await about(breaks.map(({ seq }) => seq));
  return breaks.map((one) => breakFault(one, known.get(one.seq) ?? { at: null, number: null, letter: null }));
}

/**
 * Follows the chain from an entry that is known to hold to its end.
 *
 * @param onBatch is given each part of the trail on the way
 */
export async function followChain(
  from: Link = BEFORE_THE_FIRST,
  onBatch?: (entries: readonly StoredEntry[]) => Promise<void>,
): Promise<{ end: Link; entries: number; breaks: Break[] }> {
  let before = from;
  let entries = 0;
  const breaks: Break[] = [];
  for await (const rows of entriesAfter(from.seq)) {
    for (const row of rows) {
      breaks.push(...breaksAt(before, row, entryHash(row)));
      before = { seq: row.seq, hash: row.hash };
    }
    entries += rows.length;
    await onBatch?.(rows);
  }
  return { end: before, entries, breaks };
}
