import type { Book } from '@/domain/people/may';
import type { ProposalFacts } from '@/domain/review/rules';
import type { FailingTorque } from '@/domain/revision/failingTorques';
import type { RevisionState } from '@/domain/revision/types';
import { bookOf, type BookRow } from '../book/columns';
import { app } from '../context';

/** What `withFacts` needs of a proposal; `FACTS` reads it. */
export interface FactsRow extends Pick<BookRow, 'bookKind' | 'shopId'> {
  id: string;
  withdrawnAt: string | null;
  state: RevisionState;
  hash: string;
  parentHash: string | null;
  base: string | null;
  current: string | null;
  authorId: string;
  reason: string;
  criticalReasons: string;
  failingTorques: string | null;
  everProposed: 0 | 1;
}

/** Columns and tables of a `FactsRow`: `r` the revision, `p` its procedure, `b` what it stands on, `c` what is current. */
export const FACTS = `r.id, p.bookKind, p.shopId, p.withdrawnAt, r.state, r.hash, b.hash AS parentHash, b.letter AS base,
  c.letter AS current, r.authorId, r.reason, r.criticalReasons, r.failingTorques, r.everProposed`;
export const PROPOSALS = `revisions r JOIN procedures p ON p.id = r.procedureId
  LEFT JOIN revisions b ON b.id = r.parentId
  LEFT JOIN revisions c ON c.id = p.currentRevisionId`;

export interface GivenAgreement {
  revisionId: string;
  personId: string;
  hash: string;
  base: string | null;
  at: string;
}

export interface GivenOverride {
  revisionId: string;
  personId: string;
  hash: string;
  /** Key of the torque. */
  torque: string;
  reason: string;
  at: string;
}

export interface WithFacts<R extends FactsRow> {
  row: R;
  given: GivenAgreement[];
  overrides: GivenOverride[];
  facts: ProposalFacts;
}

/** Proposals with the facts that the rules of review ask for, in four reads however many they are; in their order. */
export async function withFacts<R extends FactsRow>(rows: readonly R[]): Promise<WithFacts<R>[]> {
  if (rows.length === 0) return [];
  const { db } = await app();
  const ids = rows.map((row) => row.id);
  const given = await db.read<GivenAgreement>(
    `SELECT revisionId, personId, hash, base, at FROM agreements WHERE revisionId IN (:ids) ORDER BY at`,
    { ids },
  );
  const overrides = await db.read<GivenOverride>(
    `SELECT revisionId, personId, hash, torqueKey AS torque, reason, at FROM clampOverrides
     WHERE revisionId IN (:ids) ORDER BY at, id`,
    { ids },
  );
  const holders = await db.read<Holder>(
    `SELECT personId, scope, shopId, role FROM memberships WHERE role IN ('editor', 'senior', 'owner')`,
  );
  const questions = await db.read<{ revisionId: string; place: string }>(
    `SELECT revisionId, place FROM threads
     WHERE revisionId IN (:ids) AND kind = 'question' AND state = 'open' ORDER BY at, id`,
    { ids },
  );
  const [agreed, overridden, asked] = [byRevision(given), byRevision(overrides), byRevision(questions)];
  const answering = answerable(holders);
  return rows.map((row) => {
    const [given, overrides] = [agreed(row.id), overridden(row.id)];
    const openQuestions = asked(row.id).map(({ place }) => place);
    const facts = { ...factsOf(row), agreements: given, overrides, openQuestions, ...answering(bookOf(row)) };
    return { row, given, overrides, facts };
  });
}

/** Rows by the revision that they belong to, in their order. */
function byRevision<T extends { revisionId: string }>(rows: readonly T[]): (id: string) => T[] {
  const found = new Map<string, T[]>();
  for (const row of rows) {
    const there = found.get(row.revisionId);
    if (there) there.push(row);
    else found.set(row.revisionId, [row]);
  }
  return (id) => found.get(id) ?? [];
}

interface Holder {
  personId: string;
  scope: 'shop' | 'common' | 'network';
  shopId: string | null;
  role: string;
}

type Answerable = Pick<ProposalFacts, 'editorIds' | 'standInIds'>;

/**
 * Who answers for a book: its editors, and who may stand in for a second one. `rules.ts` says when they count. Worked
 * out once a book, since a desk has many proposals of each.
 */
function answerable(holders: readonly Holder[]): (book: Book) => Answerable {
  const known = new Map<string, Answerable>();
  return (book) => {
    const key = book.kind === 'shop' ? book.shopId : '';
    const before = known.get(key);
    if (before) return before;
    const here = holders.filter((h) =>
      book.kind === 'shop' ? h.scope === 'shop' && h.shopId === book.shopId : h.scope === 'common',
    );
    const ids = (wanted: (h: Holder) => boolean) => [...new Set(here.filter(wanted).map((h) => h.personId))];
    const found = { editorIds: ids((h) => h.role === 'editor'), standInIds: ids((h) => h.role !== 'editor') };
    known.set(key, found);
    return found;
  };
}

const factsOf = (row: FactsRow) => ({
  book: bookOf(row),
  authorId: row.authorId,
  state: row.state,
  everProposed: row.everProposed === 1,
  hash: row.hash,
  base: row.base,
  current: row.current,
  identical: row.hash === row.parentHash,
  reason: row.reason,
  criticalReasons: JSON.parse(row.criticalReasons) as string[],
  withdrawn: row.withdrawnAt !== null,
  // Never judged is only what was published before the check was kept, or a text that `judgeUnjudged` has yet to read.
  failing: row.failingTorques === null ? [] : (JSON.parse(row.failingTorques) as FailingTorque[]),
});
