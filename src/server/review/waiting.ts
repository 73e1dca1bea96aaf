import type { Database } from '@db/database';
import type { DeskRow } from '@/domain/review/deskView';
import { agreementsNeeded, isStale, tally, type ProposalFacts } from '@/domain/review/rules';
import { BOOK_COLUMNS, bookRef, type BookRow } from '../book/columns';
import { app } from '../context';
import { FACTS, PROPOSALS, withFacts, type FactsRow } from './facts';
import { severityIn } from './proposals';

/** A proposal that waits for review, the same for everybody who may see it. */
export interface Waiting {
  row: Omit<DeskRow, 'next'>;
  facts: ProposalFacts;
}

interface Row extends FactsRow, BookRow {
  number: string;
  title: string;
  author: string;
  severity: string | null;
  proposedAt: string;
}

const kept = new WeakMap<Database, { state: number; waiting: readonly Waiting[] }>();

/**
 * All proposals that wait, of every book. Hundreds take longer to read than a page takes to make, so they are kept until
 * anything at all in the book changes.
 */
export async function readWaiting(): Promise<readonly Waiting[]> {
  const { db } = await app();
  const state = await db.state();
  const before = kept.get(db);
  if (state !== null && before?.state === state) return before.waiting;
  const waiting = await read(db);
  if (state !== null) kept.set(db, { state, waiting });
  return waiting;
}

async function read(db: Database): Promise<Waiting[]> {
  const rows = await db.read<Row>(
    `SELECT ${FACTS}, ${BOOK_COLUMNS}, p.number, json_extract(r.head, '$.title') AS title, a.name AS author, r.severity,
       coalesce(r.proposedAt, r.updatedAt) AS proposedAt
     FROM ${PROPOSALS} JOIN people a ON a.id = r.authorId WHERE r.state = 'proposed'`,
  );
  return (await withFacts(rows)).map(({ row, facts }) => ({
    row: {
      id: row.id,
      number: row.number,
      title: row.title,
      book: bookRef(row),
      author: { name: row.author },
      base: facts.base,
      stale: isStale(facts),
      criticalReasons: facts.criticalReasons,
      severity: severityIn(row.severity, facts.criticalReasons),
      agreements: tally(facts).given,
      agreementsNeeded: agreementsNeeded(facts.criticalReasons),
      proposedAt: row.proposedAt,
    },
    facts,
  }));
}
