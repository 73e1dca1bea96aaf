import type { PersonRef } from '@/domain/api/schemas/common';
import { isFlagKind, type FlagFacts, type FlagKind, type FlagState } from '@/domain/flags/flags';
import { BOOK_COLUMNS, bookOf, bookRef, personColumn, personRef, type BookRow } from '../book/columns';
import { app } from '../context';

/** A flag as pages and API show it. */
export interface FlagView {
  id: string;
  number: string;
  title: string;
  book: ReturnType<typeof bookRef>;
  /** Letter of the revision that was on the screen. */
  letter: string;
  /** Null where it is about the whole sheet. `number` is null where the step is no longer in the current text. */
  step: { id: string; title: string; number: number | null } | null;
  kind: FlagKind;
  text: string;
  raisedBy: PersonRef;
  raisedAt: string;
  state: FlagState;
  endedBy: PersonRef | null;
  endedAt: string | null;
  answer: string;
  /** What was started from it, and how far that has come. */
  proposal: { id: string; state: string; letter: string | null } | null;
  seen: boolean;
}

interface Row extends BookRow {
  id: string;
  number: string;
  head: string;
  letter: string;
  stepId: string | null;
  kind: string;
  text: string;
  raisedBy: string;
  personId: string;
  raiserShops: string;
  raisedAt: string;
  state: FlagState;
  endedBy: string | null;
  endedAt: string | null;
  answer: string;
  proposal: string | null;
  seenAt: string | null;
  /** Its title when it was flagged, and its place, from 0, and title in the current text. */
  flaggedTitle: string | null;
  presentTitle: string | null;
  presentAt: number | null;
}

export interface LoadedFlag {
  facts: FlagFacts;
  view: FlagView;
}

const person = (column: string) => `(SELECT ${personColumn('q')} FROM people q WHERE q.id = ${column})`;

/** Something of the flagged step in a rendering; null where that text has no such step. */
const ofStep = (what: string, hash: string) =>
  `(SELECT ${what} FROM renderings g, json_each(g.json, '$.steps') s
     WHERE g.hash = ${hash} AND json_extract(s.value, '$.id') = f.stepId)`;
const TITLE = `json_extract(s.value, '$.title')`;

/**
 * Flags by a condition on `f`, newest first.
 *
 * @param where SQL over `f` (the flag) and `p` (its procedure)
 */
export async function loadFlags(where: string, replacements: Record<string, unknown>): Promise<LoadedFlag[]> {
  const { db } = await app();
  const rows = await db.read<Row>(
    `SELECT f.id, p.number, ${BOOK_COLUMNS}, c.head, r.letter, f.stepId, f.kind, f.text, ${person('f.personId')} AS raisedBy, f.personId,
       (SELECT json_group_array(m.shopId) FROM memberships m WHERE m.personId = f.personId AND m.shopId IS NOT NULL) AS raiserShops,
       f.createdAt AS raisedAt, f.state, ${person('f.endedById')} AS endedBy, f.endedAt, f.answer,
       (SELECT json_object('id', d.id, 'state', d.state, 'letter', d.letter) FROM revisions d WHERE d.id = f.proposalId) AS proposal,
       f.seenAt, ${ofStep(TITLE, 'r.hash')} AS flaggedTitle, ${ofStep(TITLE, 'c.hash')} AS presentTitle,
       ${ofStep('s.key', 'c.hash')} AS presentAt
     FROM flags f JOIN procedures p ON p.id = f.procedureId JOIN revisions r ON r.id = f.revisionId
       JOIN revisions c ON c.id = p.currentRevisionId
     WHERE ${where} ORDER BY f.createdAt DESC, f.id DESC LIMIT 200`,
    replacements,
  );
  return rows.map(read);
}

const stepOf = ({ stepId, flaggedTitle, presentTitle, presentAt }: Row): FlagView['step'] =>
  stepId === null
    ? null
    : {
        id: stepId,
        title: flaggedTitle ?? presentTitle ?? stepId,
        number: presentAt === null ? null : presentAt + 1,
      };

function read(row: Row): LoadedFlag {
  const { title } = JSON.parse(row.head) as { title: string };
  return {
    facts: {
      book: bookOf(row),
      raisedBy: row.personId,
      raiserShops: JSON.parse(row.raiserShops) as string[],
      state: row.state,
    },
    view: {
      id: row.id,
      number: row.number,
      title,
      book: bookRef(row),
      letter: row.letter,
      step: stepOf(row),
      kind: isFlagKind(row.kind) ? row.kind : 'unclear',
      text: row.text,
      raisedBy: personRef(row.raisedBy),
      raisedAt: row.raisedAt,
      state: row.state,
      endedBy: row.endedBy === null ? null : personRef(row.endedBy),
      endedAt: row.endedAt,
      answer: row.answer,
      proposal: row.proposal === null ? null : (JSON.parse(row.proposal) as FlagView['proposal']),
      seen: row.seenAt !== null,
    },
  };
}

/** The flag, whoever asks; null where there is none. */
export async function loadFlag(id: string): Promise<LoadedFlag | null> {
  const [found] = await loadFlags('f.id = :id', { id });
  return found ?? null;
}
