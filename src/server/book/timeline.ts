import type { ChangeWords } from '@/domain/revision/changeWords';
import type { Actor } from '@/domain/people/may';
import type { HistoryEvent, HistoryPart, ReadBy, RevisionEvent } from '@/domain/revision/timeline';
import { countsAll, readCounts } from '../bulletins/readers';
import { app } from '../context';
import { trailsOf } from '../review/trail';
import { changesOf, type Made } from './changes';
import {
  bookOf,
  personColumn,
  personRef,
  REVISION_COLUMNS,
  revisionSummary,
  type BookRow,
  type RevisionRow,
} from './columns';
import { readable } from './locate';

/** Events of one page. */
const AT_A_TIME = 25;

/** Where a page of the history begins: behind (older than) or ahead of (newer than) an event. */
export interface HistoryPlace {
  before?: string | null;
  after?: string | null;
}

// Revisions of one moment stand in the order of their letters.
const EVENTS = `WITH events AS (
    SELECT 'revision' AS kind, r.id, r.publishedAt AS at, length(r.letter) || r.letter AS rank
    FROM revisions r WHERE r.procedureId = :id AND r.letter IS NOT NULL
    UNION ALL
    SELECT b.kind, b.id, b.at, '9' || printf('%015d', b.rowid) FROM bulletins b
    WHERE b.procedureId = :id AND b.kind <> 'critical change')`;

interface Found {
  kind: HistoryEvent['kind'];
  id: string;
  at: string;
  rank: string;
}

async function placesOf(id: string, { before = null, after = null }: HistoryPlace) {
  const { db } = await app();
  const [start] = await db.read<Found>(`${EVENTS} SELECT * FROM events WHERE id = :cursor`, {
    id,
    cursor: before ?? after ?? '',
  });
  // An event that is not there begins the history anew.
  const forward = start !== undefined && before === null;
  const found = await db.read<Found>(
    `${EVENTS} SELECT * FROM events
     WHERE ${start ? `(at, rank, id) ${forward ? '>' : '<'} (:at, :rank, :event)` : '1'}
     ORDER BY at ${forward ? 'ASC' : 'DESC'}, rank ${forward ? 'ASC' : 'DESC'}, id ${forward ? 'ASC' : 'DESC'} LIMIT ${AT_A_TIME}`,
    { id, at: start?.at ?? '', rank: start?.rank ?? '', event: start?.id ?? '' },
  );
  if (forward) found.reverse();
  const [first] = found;
  const [counts] = await db.read<{ total: number; newer: number }>(
    `${EVENTS} SELECT count(*) AS total, sum((at, rank, id) > (:at, :rank, :event)) AS newer FROM events`,
    { id, at: first?.at ?? '', rank: first?.rank ?? '', event: first?.id ?? '' },
  );
  return { found, total: counts?.total ?? 0, newer: first ? (counts?.newer ?? 0) : 0 };
}

interface RevisionFound extends RevisionRow {
  id: string;
  parent: string | null;
  parentId: string | null;
  parentHash: string | null;
  bulletin: string | null;
}

async function revisionsOf(ids: readonly string[]): Promise<RevisionFound[]> {
  if (ids.length === 0) return [];
  const { db } = await app();
  return db.read<RevisionFound>(
    `SELECT r.id, ${REVISION_COLUMNS}, q.letter AS parent, q.id AS parentId, q.hash AS parentHash,
       (SELECT b.id FROM bulletins b WHERE b.revisionId = r.id AND b.kind = 'critical change') AS bulletin
     FROM revisions r LEFT JOIN revisions q ON q.id = r.parentId WHERE r.id IN (:ids)`,
    { ids },
  );
}

const madeFrom = (rows: readonly RevisionFound[]): Made[] =>
  rows.flatMap(({ id, hash, parentId, parentHash }) =>
    parentId === null || parentHash === null ? [] : [{ id, hash, parentId, parentHash }],
  );

interface ActFound {
  id: string;
  reason: string;
  by: string;
  letter: string;
}

async function actsOf(ids: readonly string[]): Promise<ActFound[]> {
  if (ids.length === 0) return [];
  const { db } = await app();
  return db.read<ActFound>(
    `SELECT b.id, json_extract(b.words, '$[0]') AS reason, r.letter,
       (SELECT ${personColumn('a')} FROM people a WHERE a.id = b.byId) AS by
     FROM bulletins b JOIN revisions r ON r.id = b.revisionId WHERE b.id IN (:ids)`,
    { ids },
  );
}

export interface HistoryOfProcedure extends HistoryPart {
  procedureId: string;
  withdrawn: boolean;
  title: string;
  /** The letter to work from. */
  current: string;
  book: ReturnType<typeof bookOf>;
}

/**
 * What happened to a procedure, latest first, 25 events at a time: its revisions with what each changed and who answered
 * for it, and when it was withdrawn and brought back. Refuses 404 what is unknown or not readable.
 */
export async function readTimeline(
  actor: Actor,
  number: string,
  place: HistoryPlace = {},
): Promise<HistoryOfProcedure> {
  const { db } = await app();
  const [row] = await db.read<
    Pick<BookRow, 'bookKind' | 'shopId'> & { id: string; withdrawn: 0 | 1; title: string; letter: string }
  >(
    `SELECT p.id, p.bookKind, p.shopId, p.withdrawnAt IS NOT NULL AS withdrawn, json_extract(r.head, '$.title') AS title, r.letter
     FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.number = :number`,
    { number },
  );
  const { id, withdrawn, title, letter: current, ...of } = readable(actor, row);
  const book = bookOf(of);
  const { found, total, newer } = await placesOf(id, place);
  const idsOf = (revision: boolean) =>
    found.filter((one) => (one.kind === 'revision') === revision).map((one) => one.id);
  const [revisions, acts] = await Promise.all([revisionsOf(idsOf(true)), actsOf(idsOf(false))]);
  const bulletins = [...acts.map((act) => act.id), ...revisions.flatMap(({ bulletin }) => bulletin ?? [])];
  const [changes, trails, counts] = await Promise.all([
    changesOf(madeFrom(revisions)),
    trailsOf(revisions.map((revision) => revision.id)),
    readCounts(actor, book, bulletins),
  ]);
  const all = countsAll(actor, book);
  const readBy = (bulletin: string | null): ReadBy | null => {
    const count = bulletin === null ? undefined : counts.get(bulletin);
    return count ? { ...count, all } : null;
  };
  const events = found.flatMap(({ kind, id: event, at }): HistoryEvent[] => {
    if (kind === 'revision') {
      const revision = revisions.find((one) => one.id === event);
      return revision
        ? [eventOf(revision, trails.get(event) ?? [], changes.get(event) ?? null, readBy(revision.bulletin))]
        : [];
    }
    const act = acts.find((one) => one.id === event);
    return act
      ? [{ kind, id: event, at, by: personRef(act.by), reason: act.reason, letter: act.letter, readBy: readBy(event) }]
      : [];
  });
  return {
    procedureId: id,
    withdrawn: withdrawn === 1,
    title,
    current,
    book,
    events,
    from: newer + 1,
    total,
    older: newer + found.length < total ? (found.at(-1)?.id ?? null) : null,
    newer: newer > 0 ? (found[0]?.id ?? null) : null,
  };
}

const eventOf = (
  row: RevisionFound,
  acts: RevisionEvent['acts'],
  changes: ChangeWords | null,
  readBy: ReadBy | null,
): RevisionEvent => ({
  kind: 'revision',
  id: row.id,
  at: row.publishedAt,
  revision: revisionSummary(row),
  parent: row.parent,
  acts,
  changes,
  readBy,
});
