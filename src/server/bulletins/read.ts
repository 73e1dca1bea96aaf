import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { asksFor, type BulletinKind } from '@/domain/bulletins/bulletin';
import type { Actor } from '@/domain/people/may';
import { BOOK_COLUMNS, bookRef, personColumn, personRef, type BookRow } from '../book/columns';
import { inReadableBooks, readableBooks } from '../book/readable';
import { app } from '../context';

interface Row extends BookRow {
  id: string;
  kind: BulletinKind;
  at: string;
  words: string;
  number: string;
  title: string;
  revisionId: string;
  letter: string;
  supersedes: string | null;
  by: string;
  signedAt: string | null;
  overtaken: 0 | 1;
  own: 0 | 1;
  readerSince: string;
}

const SELECT = `SELECT b.id, b.kind, b.at, b.words, p.number, json_extract(r.head, '$.title') AS title, ${BOOK_COLUMNS},
    r.id AS revisionId, r.letter, (SELECT letter FROM revisions WHERE id = r.parentId) AS supersedes,
    (SELECT ${personColumn('a')} FROM people a WHERE a.id = b.byId) AS by, s.at AS signedAt,
    b.kind <> 'critical change' AND EXISTS (SELECT 1 FROM bulletins l WHERE l.procedureId = b.procedureId
      AND l.kind <> 'critical change' AND l.rowid > b.rowid) AS overtaken,
    b.byId = me.id OR (b.kind = 'critical change' AND (r.authorId = me.id
      OR EXISTS (SELECT 1 FROM agreements g WHERE g.revisionId = r.id AND g.personId = me.id AND g.hash = r.hash))) AS own,
    me.createdAt AS readerSince
  FROM bulletins b JOIN procedures p ON p.id = b.procedureId JOIN revisions r ON r.id = b.revisionId
  JOIN people me ON me.id = :me
  LEFT JOIN readAndSigned s ON s.bulletinId = b.id AND s.personId = me.id`;

const bulletin = (row: Row): Bulletin => ({
  id: row.id,
  kind: row.kind,
  number: row.number,
  title: row.title,
  book: bookRef(row),
  revision: { id: row.revisionId, letter: row.letter },
  supersedes: row.kind === 'critical change' ? row.supersedes : null,
  words: JSON.parse(row.words) as string[],
  by: personRef(row.by),
  at: row.at,
  unread: asksFor({ ...row, overtaken: row.overtaken === 1, own: row.own === 1 }),
  signedAt: row.signedAt,
});

/** Bulletins of the books a person may read that meet a condition on `b` and `p`, latest first. */
export async function loadBulletins(
  actor: Actor,
  where: string,
  replacements: Record<string, unknown> = {},
): Promise<Bulletin[]> {
  const { db } = await app();
  const books = inReadableBooks(readableBooks(actor));
  const rows = await db.read<Row>(`${SELECT} WHERE ${books.where} AND (${where}) ORDER BY b.at DESC, b.rowid DESC`, {
    ...books.replacements,
    ...replacements,
    me: actor.personId,
  });
  return rows.map(bulletin);
}

/** All that a person may read: those to sign first, then the latest. */
export async function listBulletins(actor: Actor): Promise<Bulletin[]> {
  const all = await loadBulletins(actor, '1');
  return [...all.filter(({ unread }) => unread), ...all.filter(({ unread }) => !unread)];
}

/** Those that a person has still to read and sign, latest first. */
export async function unreadBulletins(actor: Actor): Promise<Bulletin[]> {
  return (await loadBulletins(actor, 's.at IS NULL')).filter(({ unread }) => unread);
}

/** When a procedure was withdrawn and brought back, latest first. Empty for one that may not be read. */
export const withdrawalsOf = (actor: Actor, number: string): Promise<Bulletin[]> =>
  loadBulletins(actor, `p.number = :number AND b.kind <> 'critical change'`, { number });

/**
 * A text that changes whenever other bulletins are unread than before, for the key of a page that shows them: bulletins
 * and signatures are only ever added, and roles stand in the key already. One cheap read.
 */
export async function unreadKey(actor: Actor): Promise<string> {
  const { db } = await app();
  const books = inReadableBooks(readableBooks(actor));
  const [row] = await db.read<{ told: number; signed: number }>(
    `SELECT (SELECT count(*) FROM bulletins b JOIN procedures p ON p.id = b.procedureId WHERE ${books.where}) AS told,
       (SELECT count(*) FROM readAndSigned WHERE personId = :me) AS signed`,
    { ...books.replacements, me: actor.personId },
  );
  return `${row?.told ?? 0} ${row?.signed ?? 0}`;
}
