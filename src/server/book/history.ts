import type { RevisionSummary } from '@/domain/api/schemas/book';
import type { ListQuery, Page } from '@/domain/api/schemas/common';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { REVISION_COLUMNS, revisionSummary, type BookRow, type RevisionRow } from './columns';
import { readable } from './locate';

type Readable = Pick<BookRow, 'bookKind' | 'shopId'>;

const FROM = `FROM procedures p JOIN revisions r ON r.procedureId = p.id AND r.letter IS NOT NULL WHERE p.number = :number`;
const LATEST_FIRST = 'ORDER BY length(r.letter) DESC, r.letter DESC';

/**
 * The revisions that were ever published, latest first; the cursor is the last letter of the page before. Refuses 404 what
 * is unknown or not readable.
 */
export async function readRevisions(
  actor: Actor,
  number: string,
  { cursor, limit }: ListQuery,
): Promise<Page<RevisionSummary>> {
  const { db } = await app();
  const [book] = await db.read<Readable>(`SELECT p.bookKind, p.shopId ${FROM} LIMIT 1`, { number });
  readable(actor, book);
  const rows = await db.read<RevisionRow>(
    `SELECT ${REVISION_COLUMNS} ${FROM}
       AND (:cursor IS NULL OR (length(r.letter), r.letter) < (length(:cursor), :cursor)) ${LATEST_FIRST} LIMIT :limit`,
    { number, cursor: cursor ?? null, limit: limit + 1 },
  );
  const items = rows.slice(0, limit).map(revisionSummary);
  return { items, next: rows.length > limit ? (items.at(-1)?.letter ?? null) : null };
}

/** Every published letter with its day, latest first: enough to choose two by. Refuses 404 likewise. */
export async function readLetters(
  actor: Actor,
  number: string,
): Promise<Pick<RevisionSummary, 'letter' | 'publishedAt'>[]> {
  const { db } = await app();
  const rows = await db.read<Readable & { letter: string; publishedAt: string }>(
    `SELECT p.bookKind, p.shopId, r.letter, r.publishedAt ${FROM} ${LATEST_FIRST}`,
    { number },
  );
  readable(actor, rows[0]);
  return rows.map(({ letter, publishedAt }) => ({ letter, publishedAt }));
}
