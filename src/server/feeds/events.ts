import type { FeedEvent, FeedKind } from '@/domain/feed/entry';
import type { Actor } from '@/domain/people/may';
import { BOOK_COLUMNS, bookRef, REVIEWERS_COLUMN, type BookRow } from '../book/columns';
import { inReadableBooks, readableBooks } from '../book/readable';
import { app } from '../context';
import type { FeedShop } from './places';

interface Row extends BookRow {
  id: string;
  kind: FeedKind;
  at: string;
  number: string;
  letter: string;
  title: string;
  author: string;
  reviewers: string;
  reason: string;
  criticalReasons: string;
  supersedes: string | null;
}

const SHEET = `p.number, r.letter, json_extract(r.head, '$.title') AS title, ${BOOK_COLUMNS}`;
const who = (id: string) => `(SELECT name FROM people WHERE id = ${id}) AS author`;

/** All that was published, withdrawn and brought back in the books of `where`; each row is told once and never changes. */
const events = (
  where: string,
) => `SELECT r.id, 'published' AS kind, r.publishedAt AS at, ${SHEET}, ${who('r.authorId')},
    ${REVIEWERS_COLUMN}, r.reason, r.criticalReasons, (SELECT letter FROM revisions WHERE id = r.parentId) AS supersedes
  FROM revisions r JOIN procedures p ON p.id = r.procedureId WHERE r.letter IS NOT NULL AND ${where}
  UNION ALL
  SELECT b.id, b.kind, b.at, ${SHEET}, ${who('b.byId')}, '[]', json_extract(b.words, '$[0]'), '[]', NULL
  FROM bulletins b JOIN procedures p ON p.id = b.procedureId JOIN revisions r ON r.id = b.revisionId
  WHERE b.kind <> 'critical change' AND ${where}`;

const event = ({ bookKind, shopId, shopName, reviewers, criticalReasons, ...row }: Row): FeedEvent => ({
  ...row,
  book: bookRef({ bookKind, shopId, shopName }).name,
  reviewers: (JSON.parse(reviewers) as { name: string }[]).map(({ name }) => name),
  criticalReasons: JSON.parse(criticalReasons) as string[],
});

/** The books of one feed: of those its person may read, the common one and that shop's. */
function booksOf(actor: Actor, shopId: FeedShop) {
  const { common, shopIds } = readableBooks(actor);
  return inReadableBooks({ common, shopIds: shopIds.filter((id) => id === shopId) });
}

/**
 * What a feed tells, latest first; at one instant by id, so that a page ends at the same place each time.
 *
 * @param before id of the entry that the page follows on; null where the feed tells of no such entry
 */
export async function listEvents(
  actor: Actor,
  shopId: FeedShop,
  { before, limit }: { before: string | null; limit: number },
): Promise<FeedEvent[] | null> {
  const { db } = await app();
  const books = booksOf(actor, shopId);
  const all = `WITH e AS (${events(books.where)})`;
  const after = before === null ? '1' : '(e.at, e.id) < (SELECT at, id FROM e WHERE id = :before)';
  if (before !== null) {
    const known = await db.read(`${all} SELECT 1 FROM e WHERE id = :before`, { ...books.replacements, before });
    if (known.length === 0) return null;
  }
  const rows = await db.read<Row>(`${all} SELECT * FROM e WHERE ${after} ORDER BY at DESC, id DESC LIMIT :limit`, {
    ...books.replacements,
    before,
    limit,
  });
  return rows.map(event);
}
