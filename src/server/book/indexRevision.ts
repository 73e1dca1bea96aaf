import type { RenderedProcedure } from '@/domain/procedure/types';
import { searchDocument } from '@/domain/search/documents';
import { now } from '../clock';
import { app } from '../context';
import { BOOK_COLUMNS, bookRef, type BookRow } from './columns';

/**
 * Makes the search know the current revision of a procedure: names and values for the reader's own search,
 * and the words of the whole text for the server's. Call it in the `write` that publishes.
 */
export async function indexRevision(procedureId: string, rendered: RenderedProcedure): Promise<void> {
  const { db } = await app();
  await db.write(async () => {
    const [row] = await db.read<BookRow & { number: string; letter: string; hash: string; publishedAt: string }>(
      `SELECT p.number, ${BOOK_COLUMNS}, r.letter, r.hash, r.publishedAt
       FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.id = :procedureId`,
      { procedureId },
    );
    if (!row) throw new Error('Only a published procedure can be searched for.');
    const { number, letter, publishedAt, hash } = row;
    const document = searchDocument(rendered, { number, letter, publishedAt, book: bookRef(row).name });
    await db.models.SearchDocument.upsert({
      procedureId,
      book: row.shopId ?? 'common',
      hash,
      json: JSON.stringify(document),
      // Said here because an upsert leaves it as it was; by it the search sees that the book has changed.
      updatedAt: now(),
    });
    const { title, summary } = rendered.frontmatter;
    const words = [title, summary, ...rendered.steps.flatMap((step) => [step.title, step.text, ...step.holds])].join(
      '\n',
    );
    await db.sequelize.query('DELETE FROM searchWords WHERE procedureId = :procedureId', {
      replacements: { procedureId },
    });
    await db.sequelize.query('INSERT INTO searchWords (procedureId, words) VALUES (:procedureId, :words)', {
      replacements: { procedureId, words },
    });
  });
}

/** Makes the search say that a procedure is withdrawn, or no longer. Call it in the `write` that does it. */
export async function markWithdrawn(procedureId: string, withdrawn: boolean): Promise<void> {
  const { db } = await app();
  await db.sequelize.query(
    `UPDATE searchDocuments SET updatedAt = :at,
       json = CASE WHEN :withdrawn THEN json_set(json, '$.withdrawn', json('true')) ELSE json_remove(json, '$.withdrawn') END
     WHERE procedureId = :procedureId`,
    { replacements: { procedureId, withdrawn, at: now() } },
  );
}
