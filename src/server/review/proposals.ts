import type { RevisionHead } from '@db/models/book';
import { severityOf } from '@/domain/revision/severity';
import type { Severity, TakenBackFrom } from '@/domain/revision/types';
import { AUTHOR_COLUMN, BOOK_COLUMNS, type BookRow } from '../book/columns';
import { app } from '../context';
import { FACTS, PROPOSALS, withFacts, type FactsRow, type WithFacts } from './facts';

interface Row extends FactsRow, BookRow {
  number: string;
  procedureId: string;
  currentRevisionId: string | null;
  letter: string | null;
  version: number;
  /** The text; of a list only that of a draft which cannot be read, for its title. */
  source: string | null;
  head: string | null;
  parentId: string | null;
  parentTitle: string | null;
  author: string;
  takesBack: string;
  severity: string | null;
  createdAt: string;
  updatedAt: string;
  proposedAt: string | null;
}

/** A revision on its way as a list has it, with the facts that the rules of review ask for. */
export interface Listed
  extends
    Omit<Row, 'head' | 'criticalReasons' | 'takesBack' | 'failingTorques' | 'severity' | 'everProposed'>,
    Omit<WithFacts<Row>, 'row'> {
  head: RevisionHead | null;
  criticalReasons: readonly string[];
  takesBack: TakenBackFrom[];
  severity: Severity;
}

/** One proposal, with its text. */
export interface Loaded extends Listed {
  source: string;
}

// A text may be 64 KB, so a list leaves out all that it can.
const UNREAD = 'CASE WHEN r.head IS NULL THEN r.source END';
const select = (source: string) => `SELECT ${FACTS}, ${BOOK_COLUMNS}, p.number, p.id AS procedureId,
    p.currentRevisionId, r.letter, r.version, ${source} AS source, r.head, r.parentId,
    json_extract(b.head, '$.title') AS parentTitle, ${AUTHOR_COLUMN}, r.takesBack, r.severity, r.createdAt, r.updatedAt,
    r.proposedAt
  FROM ${PROPOSALS}`;

/**
 * Proposals that meet a condition on `r` (revision) and `p` (procedure), with their facts. Nobody is asked whether they
 * may see them: that is the caller's part.
 */
export const loadProposals = (where: string, replacements: Record<string, unknown>): Promise<Listed[]> =>
  load(UNREAD, where, replacements);

/** One proposal, or undefined. */
export async function loadProposal(id: string): Promise<Loaded | undefined> {
  const [found] = await load('r.source', 'r.id = :id', { id });
  return found && { ...found, source: found.source ?? '' };
}

async function load(source: string, where: string, replacements: Record<string, unknown>): Promise<Listed[]> {
  const { db } = await app();
  const rows = await db.read<Row>(`${select(source)} WHERE ${where}`, replacements);
  return (await withFacts(rows)).map(listed);
}

/** How grave a proposal is; of one that was kept before it was weighed so, by its critical reasons. */
export const severityIn = (json: string | null, criticalReasons: readonly string[]): Severity =>
  json === null ? severityOf([], [], criticalReasons) : (JSON.parse(json) as Severity);

function listed({ row, ...standing }: WithFacts<Row>): Listed {
  const { head, takesBack, severity, failingTorques: _failing, everProposed: _ever, ...rest } = row;
  const { criticalReasons } = standing.facts;
  return {
    ...rest,
    ...standing,
    head: head === null ? null : (JSON.parse(head) as RevisionHead),
    criticalReasons,
    takesBack: JSON.parse(takesBack) as TakenBackFrom[],
    severity: severityIn(severity, criticalReasons),
  };
}
