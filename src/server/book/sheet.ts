import type { Sheet } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import {
  BOOK_COLUMNS,
  bookRef,
  byLetter,
  personColumn,
  REVISION_COLUMNS,
  revisionSummary,
  type BookRow,
  type RevisionRow,
} from './columns';
import { readable } from './locate';
import { RENDERING_FORM, renderingOf } from './rendering';

const FROM = `FROM procedures p
  JOIN revisions c ON c.id = p.currentRevisionId
  JOIN revisions r ON r.procedureId = p.id AND r.letter = ifnull(:letter, c.letter)
  WHERE p.number = :number`;
const OPEN = `(SELECT count(*) FROM revisions o WHERE o.procedureId = p.id AND o.state = 'proposed') AS openProposals`;
/** Who withdrew it, when and why, as JSON; null while it is in use. */
const WITHDRAWN = `(SELECT json_object('at', b.at, 'reason', json_extract(b.words, '$[0]'),
    'by', (SELECT json(${personColumn('a')}) FROM people a WHERE a.id = b.byId))
  FROM bulletins b WHERE b.procedureId = p.id AND b.kind = 'withdrawn' AND b.at = p.withdrawnAt
  ORDER BY b.rowid DESC LIMIT 1) AS withdrawn`;
const CURRENT = `c.letter AS currentLetter, c.publishedAt AS currentAt`;

const inShort = (time: string): string => Date.parse(time).toString(36);

interface KeyRow extends BookRow {
  revisionId: string;
  hash: string;
  letter: string;
  currentLetter: string;
  currentAt: string;
  openProposals: number;
}

/** All that decides what a sheet says, without the sheet. */
export interface SheetKey {
  revisionId: string;
  hash: string;
  letter: string;
  currentLetter: string;
  isCurrent: boolean;
  openProposals: number;
  /** An entity tag that changes whenever the sheet would read differently. */
  tag: string;
}

/** One cheap read, for an ETag or the key of a cache. Refuses 404 what is unknown or not readable. */
export async function readSheetKey(actor: Actor, number: string, letter?: string): Promise<SheetKey> {
  const { db } = await app();
  const [found] = await db.read<KeyRow & { peopleAt: string; withdrawnAt: string | null }>(
    `SELECT p.bookKind, p.shopId, NULL AS shopName, r.id AS revisionId, r.hash, r.letter, ${CURRENT}, ${OPEN}, p.withdrawnAt,
       (SELECT max(updatedAt) FROM people WHERE id = r.authorId
          OR id IN (SELECT byId FROM bulletins WHERE procedureId = p.id)
          OR id IN (SELECT personId FROM agreements WHERE revisionId = r.id)) AS peopleAt
     ${FROM}`,
    { number, letter: letter ?? null },
  );
  const row = readable(actor, found);
  const { revisionId, hash, currentLetter, openProposals } = row;
  return {
    revisionId,
    hash,
    letter: row.letter,
    currentLetter,
    isCurrent: row.letter === currentLetter,
    openProposals,
    tag: `"${hash.slice(0, 16)}-${currentLetter}-${openProposals}-${RENDERING_FORM}-${inShort(row.peopleAt)}${row.withdrawnAt === null ? '' : `-w${inShort(row.withdrawnAt)}`}"`,
  };
}

/** The current sheet of a procedure, or the sheet at one revision. Refuses 404 what is unknown or not readable. */
export async function readSheet(actor: Actor, number: string, letter?: string): Promise<Sheet> {
  const { db } = await app();
  const [found] = await db.read<
    KeyRow &
      RevisionRow & {
        number: string;
        earlier: number;
        withdrawn: string | null;
        source: string;
        form: number | null;
        json: string | null;
      }
  >(
    `SELECT p.number, ${BOOK_COLUMNS}, r.id AS revisionId, ${REVISION_COLUMNS}, r.source, ${CURRENT}, ${OPEN}, ${WITHDRAWN},
       (SELECT count(*) FROM revisions e WHERE e.procedureId = p.id AND e.letter IS NOT NULL
          AND (${byLetter('e')}) < (${byLetter('r')})) AS earlier,
       (SELECT form FROM renderings WHERE hash = r.hash) AS form,
       (SELECT json FROM renderings WHERE hash = r.hash) AS json
     ${FROM}`,
    { number, letter: letter ?? null },
  );
  const row = readable(actor, found);
  const { frontmatter, introHtml, steps } = await renderingOf(row, row);
  return {
    number: row.number,
    title: frontmatter.title,
    book: bookRef(row),
    revision: revisionSummary(row),
    current: { letter: row.currentLetter, publishedAt: row.currentAt },
    earlier: row.earlier,
    withdrawn: row.withdrawn === null ? null : (JSON.parse(row.withdrawn) as Sheet['withdrawn']),
    openProposals: row.openProposals,
    frontmatter,
    introHtml,
    steps,
    source: row.source,
  };
}
