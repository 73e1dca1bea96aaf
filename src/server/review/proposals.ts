import type { RevisionHead } from '@db/models/book';
import type { Book } from '@/domain/people/may';
import type { ProposalFacts } from '@/domain/review/rules';
import type { FailingTorque } from '@/domain/revision/failingTorques';
import { severityOf } from '@/domain/revision/severity';
import type { RevisionState, Severity, TakenBackFrom } from '@/domain/revision/types';
import { AUTHOR_COLUMN, BOOK_COLUMNS, bookOf, type BookRow } from '../book/columns';
import { app } from '../context';

interface Row extends BookRow {
  id: string;
  number: string;
  procedureId: string;
  currentRevisionId: string | null;
  withdrawnAt: string | null;
  letter: string | null;
  state: RevisionState;
  version: number;
  source: string;
  hash: string;
  head: string | null;
  parentId: string | null;
  parentHash: string | null;
  parentTitle: string | null;
  base: string | null;
  current: string | null;
  authorId: string;
  author: string;
  reason: string;
  criticalReasons: string;
  takesBack: string;
  failingTorques: string | null;
  severity: string | null;
  everProposed: 0 | 1;
  createdAt: string;
  updatedAt: string;
  proposedAt: string | null;
}

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

/** A revision on its way, with the facts that the rules of review ask for. */
export interface Loaded extends Omit<
  Row,
  'head' | 'criticalReasons' | 'takesBack' | 'failingTorques' | 'severity' | 'everProposed'
> {
  head: RevisionHead | null;
  criticalReasons: string[];
  takesBack: TakenBackFrom[];
  severity: Severity;
  given: GivenAgreement[];
  overrides: GivenOverride[];
  facts: ProposalFacts;
}

const SELECT = `SELECT r.id, p.number, p.id AS procedureId, p.currentRevisionId, p.withdrawnAt, ${BOOK_COLUMNS}, r.letter, r.state,
    r.version, r.source, r.hash, r.head, r.parentId, b.hash AS parentHash, b.letter AS base,
    json_extract(b.head, '$.title') AS parentTitle, c.letter AS current, r.authorId, ${AUTHOR_COLUMN}, r.reason,
    r.criticalReasons, r.takesBack, r.failingTorques, r.severity, r.everProposed, r.createdAt, r.updatedAt, r.proposedAt
  FROM revisions r JOIN procedures p ON p.id = r.procedureId
  LEFT JOIN revisions b ON b.id = r.parentId
  LEFT JOIN revisions c ON c.id = p.currentRevisionId`;

/**
 * Proposals that meet a condition on `r` (revision) and `p` (procedure), with their facts, in four reads
 * however many they are. Nobody is asked whether they may see them: that is the caller's part.
 */
export async function loadProposals(where: string, replacements: Record<string, unknown>): Promise<Loaded[]> {
  const { db } = await app();
  const rows = await db.read<Row>(`${SELECT} WHERE ${where}`, replacements);
  if (rows.length === 0) return [];
  const given = await db.read<GivenAgreement>(
    `SELECT revisionId, personId, hash, base, at FROM agreements WHERE revisionId IN (:ids) ORDER BY at`,
    { ids: rows.map((row) => row.id) },
  );
  const overrides = await db.read<GivenOverride>(
    `SELECT revisionId, personId, hash, torqueKey AS torque, reason, at FROM clampOverrides
     WHERE revisionId IN (:ids) ORDER BY at, id`,
    { ids: rows.map((row) => row.id) },
  );
  const holders = await db.read<Holder>(
    `SELECT personId, scope, shopId, role FROM memberships WHERE role IN ('editor', 'senior', 'owner')`,
  );
  const questions = await db.read<{ revisionId: string; place: string }>(
    `SELECT revisionId, place FROM threads
     WHERE revisionId IN (:ids) AND kind = 'question' AND state = 'open' ORDER BY at, id`,
    { ids: rows.map((row) => row.id) },
  );
  return rows.map((row) =>
    loaded(
      row,
      given.filter((g) => g.revisionId === row.id),
      overrides.filter((o) => o.revisionId === row.id),
      holders,
      questions.filter((q) => q.revisionId === row.id).map(({ place }) => place),
    ),
  );
}

/** One proposal, or undefined. */
export async function loadProposal(id: string): Promise<Loaded | undefined> {
  const [found] = await loadProposals('r.id = :id', { id });
  return found;
}

interface Holder {
  personId: string;
  scope: 'shop' | 'common' | 'network';
  shopId: string | null;
  role: string;
}

/** Who answers for a book: its editors, and who may stand in for a second one. `rules.ts` says when they count. */
function answerable(book: Book, holders: Holder[]) {
  const here = holders.filter((h) =>
    book.kind === 'shop' ? h.scope === 'shop' && h.shopId === book.shopId : h.scope === 'common',
  );
  const ids = (wanted: (h: Holder) => boolean) => [...new Set(here.filter(wanted).map((h) => h.personId))];
  return { editorIds: ids((h) => h.role === 'editor'), standInIds: ids((h) => h.role !== 'editor') };
}

function loaded(
  { head, criticalReasons, takesBack, failingTorques, severity, everProposed, ...row }: Row,
  given: GivenAgreement[],
  overrides: GivenOverride[],
  holders: Holder[],
  openQuestions: string[],
): Loaded {
  const book = bookOf(row);
  const reasons = JSON.parse(criticalReasons) as string[];
  return {
    ...row,
    head: head === null ? null : (JSON.parse(head) as RevisionHead),
    criticalReasons: reasons,
    takesBack: JSON.parse(takesBack) as TakenBackFrom[],
    severity: severity === null ? severityOf([], [], reasons) : (JSON.parse(severity) as Severity),
    given,
    overrides,
    facts: {
      book,
      authorId: row.authorId,
      state: row.state,
      everProposed: everProposed === 1,
      hash: row.hash,
      base: row.base,
      current: row.current,
      identical: row.hash === row.parentHash,
      reason: row.reason,
      criticalReasons: reasons,
      withdrawn: row.withdrawnAt !== null,
      agreements: given,
      openQuestions,
      // Never judged is only what was published before the check was kept, or a text that `judgeUnjudged` has yet to read.
      failing: failingTorques === null ? [] : (JSON.parse(failingTorques) as FailingTorque[]),
      overrides,
      ...answerable(book, holders),
    },
  };
}
