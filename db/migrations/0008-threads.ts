import type { Migration } from './migration';

const times = `
      createdAt TEXT NOT NULL,
      updatedAt TEXT NOT NULL`;

const refuse = (name: string, when: string, message: string) =>
  `CREATE TRIGGER ${name} ${when} BEGIN SELECT RAISE(ABORT, '${message}'); END`;

/** What was said first, by whom and of what never changes; whether it is open does. */
const FROZEN = ['revisionId', 'personId', 'kind', 'anchor', 'place', 'suggestion', 'at'];
const changed = FROZEN.map((column) => `OLD.${column} IS NOT NEW.${column}`).join(' OR ');

/** Remarks, questions and suggestions on a proposed text, with their messages. Nothing of them is ever deleted. */
export const threads: Migration = {
  name: '0008-threads',
  up: [
    `CREATE TABLE threads (
      id TEXT PRIMARY KEY NOT NULL,
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      personId TEXT NOT NULL REFERENCES people (id),
      kind TEXT NOT NULL CHECK (kind IN ('remark', 'question', 'suggestion')),
      anchor TEXT,
      place TEXT NOT NULL,
      suggestion JSON,
      state TEXT NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'resolved')),
      openedAt INTEGER NOT NULL DEFAULT 1,
      resolvedById TEXT REFERENCES people (id),
      resolvedAt TEXT,
      acceptedAt TEXT,
      version INTEGER NOT NULL DEFAULT 1,
      at TEXT NOT NULL,${times},
      CHECK ((kind = 'suggestion') = (suggestion IS NOT NULL)),
      CHECK ((state = 'resolved') = (resolvedById IS NOT NULL AND resolvedAt IS NOT NULL)),
      CHECK (acceptedAt IS NULL OR (kind = 'suggestion' AND state = 'resolved'))
    )`,
    `CREATE INDEX threads_by_revision ON threads (revisionId, at)`,
    `CREATE TABLE threadMessages (
      id TEXT PRIMARY KEY NOT NULL,
      threadId TEXT NOT NULL REFERENCES threads (id),
      personId TEXT NOT NULL REFERENCES people (id),
      text TEXT NOT NULL CHECK (length(trim(text)) > 0),
      mentions JSON NOT NULL DEFAULT '[]',
      at TEXT NOT NULL,${times}
    )`,
    `CREATE INDEX threadMessages_by_thread ON threadMessages (threadId, at)`,
    refuse('threads_words_stay', `BEFORE UPDATE ON threads WHEN ${changed}`, 'What a thread is about never changes'),
    refuse(
      'threads_accepted_stays',
      'BEFORE UPDATE ON threads WHEN OLD.acceptedAt IS NOT NULL AND OLD.acceptedAt IS NOT NEW.acceptedAt',
      'A suggestion that was taken up stays so',
    ),
    refuse('threads_kept', 'BEFORE DELETE ON threads', 'A thread is never deleted'),
    refuse('threadMessages_stay', 'BEFORE UPDATE ON threadMessages', 'A message is never changed'),
    refuse('threadMessages_kept', 'BEFORE DELETE ON threadMessages', 'A message is never deleted'),
    refuse(
      'revisions_publish_without_questions',
      `BEFORE UPDATE OF state ON revisions WHEN NEW.state = 'published' AND OLD.state = 'proposed'
        AND EXISTS (SELECT 1 FROM threads WHERE revisionId = NEW.id AND kind = 'question' AND state = 'open')`,
      'A revision is not published over an open question',
    ),
  ],
  down: ['DROP TRIGGER revisions_publish_without_questions', 'DROP TABLE threadMessages', 'DROP TABLE threads'],
};
