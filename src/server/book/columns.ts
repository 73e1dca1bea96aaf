import type { ClampOverride, RevisionSummary } from '@/domain/api/schemas/book';
import type { BookRef, PersonRef } from '@/domain/api/schemas/common';
import type { Book } from '@/domain/people/may';
import type { RevisionState } from '@/domain/revision/types';

/** A person of alias `a` as JSON, with the shop they work in. */
export const personColumn = (a: string) =>
  `json_object('id', ${a}.id, 'name', ${a}.name, 'shop', (SELECT name FROM shops WHERE id = ${a}.currentShopId))`;

/** Where a procedure `p` stands. */
export const BOOK_COLUMNS = `p.bookKind, p.shopId, (SELECT name FROM shops WHERE id = p.shopId) AS shopName`;
export interface BookRow {
  bookKind: 'common' | 'shop';
  shopId: string | null;
  shopName: string | null;
}

export const bookOf = ({ bookKind, shopId }: Pick<BookRow, 'bookKind' | 'shopId'>): Book =>
  bookKind === 'shop' && shopId !== null ? { kind: 'shop', shopId } : { kind: 'common' };

export const bookRef = ({ bookKind, shopId, shopName }: BookRow): BookRef => ({
  kind: bookKind,
  shopId,
  name: bookKind === 'common' ? 'Common book' : (shopName ?? ''),
});

/** The author of revision `r` as JSON. */
export const AUTHOR_COLUMN = `(SELECT ${personColumn('a')} FROM people a WHERE a.id = r.authorId) AS author`;
/** Whoever agreed to the very text of revision `r` on its very base. */
export const REVIEWERS_COLUMN = `(SELECT json_group_array(json(who)) FROM (
    SELECT ${personColumn('a')} AS who FROM agreements g JOIN people a ON a.id = g.personId
    WHERE g.revisionId = r.id AND g.hash = r.hash AND g.base IS (SELECT letter FROM revisions WHERE id = r.parentId)
    ORDER BY g.at)) AS reviewers`;

/** Why torques of the very text of revision `r` stay that fail the clamp check. */
export const OVERRIDES_COLUMN = `(SELECT json_group_array(json(how)) FROM (
    SELECT json_object('torque', coalesce((SELECT json_extract(f.value, '$.name') FROM json_each(r.failingTorques) f
        WHERE json_extract(f.value, '$.key') = o.torqueKey), o.torqueKey),
      'share', o.share, 'person', ${personColumn('a')}, 'reason', o.reason, 'at', o.at) AS how
    FROM clampOverrides o JOIN people a ON a.id = o.personId
    WHERE o.revisionId = r.id AND o.hash = r.hash ORDER BY o.at, o.id)) AS overrides`;

/** What a title block or a history says of a published revision `r`. */
export const REVISION_COLUMNS = `r.letter, r.state, r.hash, r.publishedAt, r.reason, ${AUTHOR_COLUMN}, ${REVIEWERS_COLUMN}, ${OVERRIDES_COLUMN}`;
export interface RevisionRow {
  letter: string;
  state: RevisionState;
  hash: string;
  publishedAt: string;
  reason: string;
  author: string;
  reviewers: string;
  overrides: string;
}

export const personRef = (json: string) => JSON.parse(json) as PersonRef;

/** First 8 hex digits of the hash: what is printed on a sheet. */
const sheetCheck = (hash: string) => hash.slice(0, 8);

export const revisionSummary = (row: RevisionRow): RevisionSummary => ({
  letter: row.letter,
  state: row.state,
  hash: row.hash,
  sheetCheck: sheetCheck(row.hash),
  publishedAt: row.publishedAt,
  reason: row.reason,
  author: personRef(row.author),
  reviewers: JSON.parse(row.reviewers) as PersonRef[],
  overrides: JSON.parse(row.overrides) as ClampOverride[],
});

/** Sorts revisions of one procedure by letter: A to Y, then AA. */
export const byLetter = (alias: string) => `length(${alias}.letter), ${alias}.letter`;
