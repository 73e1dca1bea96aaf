import { may, type Actor, type Book } from '@/domain/people/may';
import { app } from '../context';

/** How many were asked to read and sign a bulletin, and how many of them have. */
export interface ReadCount {
  signed: number;
  asked: number;
}

/** Whose signatures a person may count: everybody's who answers for the book, else those of their own shops. */
export const countsAll = (actor: Actor, book: Book): boolean =>
  may(actor, 'readAudit', null).ok || may(actor, 'withdraw', { book }).ok;

/**
 * Read-and-sign counts of bulletins, by their ids. Asked are those who read the book, were there when it happened and did
 * not do it themselves, as `asksFor` says of one reader. Nobody learns how many people another shop has.
 */
export async function readCounts(actor: Actor, book: Book, ids: readonly string[]): Promise<Map<string, ReadCount>> {
  if (ids.length === 0) return new Map();
  const { db } = await app();
  const all = countsAll(actor, book);
  const shops = actor.memberships.flatMap((m) => (m.in === 'shop' ? [m.shopId] : []));
  const rows = await db.read<ReadCount & { id: string }>(
    `SELECT b.id, count(*) AS asked, count(s.id) AS signed
     FROM bulletins b JOIN revisions r ON r.id = b.revisionId
     JOIN people w ON w.kind = 'person' AND w.createdAt <= b.at AND EXISTS (SELECT 1 FROM memberships m
       WHERE m.personId = w.id AND (b.shopId IS NULL OR m.shopId = b.shopId) ${all ? '' : 'AND m.shopId IN (:shops)'})
     LEFT JOIN readAndSigned s ON s.bulletinId = b.id AND s.personId = w.id
     WHERE b.id IN (:ids) AND b.byId <> w.id AND NOT (b.kind = 'critical change' AND (r.authorId = w.id
       OR EXISTS (SELECT 1 FROM agreements g WHERE g.revisionId = r.id AND g.personId = w.id AND g.hash = r.hash)))
     GROUP BY b.id`,
    { ids, shops: shops.length > 0 ? shops : [''] },
  );
  return new Map(rows.map(({ id, signed, asked }) => [id, { signed, asked }]));
}
