import type { RevisionSummary } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { REVISION_COLUMNS, revisionSummary, type BookRow, type RevisionRow } from './columns';
import { readable } from './locate';

/** The revisions that were ever published, latest first. Refuses 404 what is unknown or not readable. */
export async function readHistory(actor: Actor, number: string): Promise<RevisionSummary[]> {
  const { db } = await app();
  const rows = await db.read<Pick<BookRow, 'bookKind' | 'shopId'> & RevisionRow>(
    `SELECT p.bookKind, p.shopId, ${REVISION_COLUMNS}
     FROM procedures p JOIN revisions r ON r.procedureId = p.id AND r.letter IS NOT NULL
     WHERE p.number = :number ORDER BY length(r.letter) DESC, r.letter DESC`,
    { number },
  );
  readable(actor, rows[0]);
  return rows.map(revisionSummary);
}
