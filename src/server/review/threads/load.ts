import type { PersonRef } from '@/domain/api/schemas/common';
import type { ThreadMessage } from '@/domain/api/schemas/threads';
import type { Suggestion } from '@/domain/review/suggestions';
import type { ThreadFacts, ThreadKind } from '@/domain/review/threads';
import { personColumn, personRef } from '../../book/columns';
import { app } from '../../context';

interface Row {
  id: string;
  revisionId: string;
  personId: string;
  kind: ThreadKind;
  anchor: string | null;
  place: string;
  suggestion: string | null;
  state: 'open' | 'resolved';
  openedAt: number;
  resolvedBy: string | null;
  resolvedAt: string | null;
  acceptedAt: string | null;
  version: number;
}

interface MessageRow {
  id: string;
  threadId: string;
  at: string;
  text: string;
  mentions: string;
  person: string;
}

/** A thread as it is stored, with what the rules ask of it. */
export interface LoadedThread extends Omit<Row, 'suggestion' | 'resolvedBy'> {
  suggestion: Suggestion | null;
  resolvedBy: PersonRef | null;
  messages: Omit<ThreadMessage, 'photos'>[];
  facts: ThreadFacts;
}

/** Threads that meet a condition on `t`, oldest first. Nobody is asked whether they may see them. */
async function load(where: string, replacements: Record<string, unknown>): Promise<LoadedThread[]> {
  const { db } = await app();
  const rows = await db.read<Row>(
    `SELECT t.id, t.revisionId, t.personId, t.kind, t.anchor, t.place, t.suggestion, t.state, t.openedAt, t.resolvedAt,
       t.acceptedAt, t.version, (SELECT ${personColumn('a')} FROM people a WHERE a.id = t.resolvedById) AS resolvedBy
     FROM threads t WHERE ${where} ORDER BY t.at, t.id`,
    replacements,
  );
  if (rows.length === 0) return [];
  const messages = await db.read<MessageRow>(
    `SELECT m.id, m.threadId, m.at, m.text, m.mentions, ${personColumn('a')} AS person
     FROM threadMessages m JOIN people a ON a.id = m.personId WHERE m.threadId IN (:ids) ORDER BY m.at, m.id`,
    { ids: rows.map(({ id }) => id) },
  );
  return rows.map((row) => {
    const own = messages
      .filter(({ threadId }) => threadId === row.id)
      .map(({ id, at, text, mentions, person }) => ({
        id,
        at,
        text,
        mentions: JSON.parse(mentions) as ThreadMessage['mentions'],
        person: personRef(person),
      }));
    const suggestion = row.suggestion === null ? null : (JSON.parse(row.suggestion) as Suggestion);
    return {
      ...row,
      suggestion,
      resolvedBy: row.resolvedBy === null ? null : personRef(row.resolvedBy),
      messages: own,
      facts: {
        kind: row.kind,
        personId: row.personId,
        state: row.state,
        accepted: row.acceptedAt !== null,
        writers: own.map(({ person }) => person.id),
        openedAt: row.openedAt,
        suggestion,
      },
    };
  });
}

export const threadsOf = (revisionId: string): Promise<LoadedThread[]> =>
  load('t.revisionId = :revisionId', { revisionId });

export async function loadThread(id: string): Promise<LoadedThread | undefined> {
  const [found] = await load('t.id = :id', { id });
  return found;
}
