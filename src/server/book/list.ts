import type { RevisionHead } from '@db/models/book';
import type { ProcedureSummary } from '@/domain/api/schemas/book';
import type { ListQuery, Page } from '@/domain/api/schemas/common';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { BOOK_COLUMNS, bookRef, type BookRow } from './columns';
import { inReadableBooks, readableBooks } from './readable';

interface Row extends BookRow {
  number: string;
  letter: string;
  hash: string;
  publishedAt: string;
  head: string;
  withdrawn: 0 | 1;
}

/** The published procedures of the books a person may read, by number; the cursor is the last number of the page before. */
export async function listProcedures(actor: Actor, { cursor, limit }: ListQuery): Promise<Page<ProcedureSummary>> {
  const { db } = await app();
  const books = inReadableBooks(readableBooks(actor));
  const rows = await db.read<Row>(
    `SELECT p.number, ${BOOK_COLUMNS}, r.letter, r.hash, r.publishedAt, r.head, p.withdrawnAt IS NOT NULL AS withdrawn
     FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId
     WHERE ${books.where} AND (length(p.number), p.number) > (length(:after), :after)
     ORDER BY length(p.number), p.number LIMIT :limit`,
    { ...books.replacements, after: cursor ?? '', limit: limit + 1 },
  );
  const items = rows.slice(0, limit).map(summary);
  return { items, next: rows.length > limit ? (items.at(-1)?.number ?? null) : null };
}

function summary(row: Row): ProcedureSummary {
  const head = JSON.parse(row.head) as RevisionHead;
  return {
    number: row.number,
    book: bookRef(row),
    ...head,
    revision: { letter: row.letter, hash: row.hash, publishedAt: row.publishedAt },
    withdrawn: row.withdrawn === 1,
  };
}
