import type { BookEvent, Publication, Who, Withdrawal } from '@/domain/export/git/bookHistory';
import { OVERRIDES_COLUMN, REVIEWERS_COLUMN } from '../book/columns';
import { app } from '../context';

const person = (id: string) =>
  `(SELECT json_object('id', id, 'name', name, 'email', email) FROM people WHERE id = ${id})`;
const SHEET = `p.number, r.letter, json_extract(r.head, '$.title') AS title`;

interface RevisionRow extends Omit<Publication, 'kind' | 'author' | 'by' | 'reviewers' | 'overrides'> {
  author: string;
  by: string;
  reviewers: string;
  overrides: string;
}

async function publications(shopId: string | null): Promise<Publication[]> {
  const { db } = await app();
  // Who published stands in the trail alone; what was there before the trail was its author's doing.
  const rows = await db.read<RevisionRow>(
    `SELECT r.id AS revisionId, r.publishedAt AS at, ${SHEET}, r.reason, r.source, r.hash, r.proposedAt,
       ${person('r.authorId')} AS author, ${REVIEWERS_COLUMN}, ${OVERRIDES_COLUMN},
       ${person(`ifnull((SELECT a.actorId FROM auditEntries a WHERE a.act = 'revision.published'
         AND a.subjectId = r.id AND a.actorId IS NOT NULL ORDER BY a.seq LIMIT 1), r.authorId)`)} AS by
     FROM revisions r JOIN procedures p ON p.id = r.procedureId
     WHERE r.letter IS NOT NULL AND p.shopId IS :shopId ORDER BY p.number, length(r.letter), r.letter`,
    { shopId },
  );
  return rows.map(({ author, by, reviewers, overrides, ...row }) => ({
    ...row,
    kind: 'published',
    author: JSON.parse(author) as Who,
    by: JSON.parse(by) as Who,
    reviewers: (JSON.parse(reviewers) as Who[]).map(({ name }) => name),
    overrides: (JSON.parse(overrides) as { torque: string; reason: string; person: Who }[]).map((one) => ({
      ...one,
      person: one.person.name,
    })),
  }));
}

async function withdrawals(shopId: string | null): Promise<Withdrawal[]> {
  const { db } = await app();
  const rows = await db.read<Omit<Withdrawal, 'by'> & { by: string }>(
    `SELECT b.kind, b.at, ${SHEET}, json_extract(b.words, '$[0]') AS reason, ${person('b.byId')} AS by
     FROM bulletins b JOIN procedures p ON p.id = b.procedureId JOIN revisions r ON r.id = b.revisionId
     WHERE b.kind <> 'critical change' AND p.shopId IS :shopId ORDER BY b.rowid`,
    { shopId },
  );
  return rows.map((row) => ({ ...row, by: JSON.parse(row.by) as Who }));
}

/** All that happened to one book, the common one where `shopId` is null. For whoever runs the server: it asks nobody's role. */
export const readBookEvents = async (shopId: string | null): Promise<BookEvent[]> => [
  ...(await publications(shopId)),
  ...(await withdrawals(shopId)),
];
