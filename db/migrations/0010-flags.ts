import { times, type Migration } from './migration';

/** "Something is wrong or unclear here": raised from a step, answered or taken up once. */
export const flags: Migration = {
  name: '0010-flags',
  up: [
    `CREATE TABLE flags (
      id TEXT PRIMARY KEY NOT NULL,
      procedureId TEXT NOT NULL REFERENCES procedures (id),
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      stepId TEXT,
      kind TEXT NOT NULL CHECK (kind IN ('wrong', 'unclear', 'missing')),
      text TEXT NOT NULL CHECK (length(trim(text)) > 0),
      personId TEXT NOT NULL REFERENCES people (id),
      state TEXT NOT NULL CHECK (state IN ('open', 'answered', 'taken up', 'withdrawn')),
      endedById TEXT REFERENCES people (id),
      endedAt TEXT,
      answer TEXT NOT NULL DEFAULT '',
      proposalId TEXT REFERENCES revisions (id) ON DELETE SET NULL,
      seenAt TEXT,${times},
      CHECK ((state = 'open') = (endedById IS NULL)),
      CHECK (state <> 'answered' OR length(trim(answer)) > 0)
    )`,
    'CREATE INDEX flags_by_state ON flags (state, procedureId)',
    'CREATE INDEX flags_by_person ON flags (personId)',
    `CREATE TRIGGER flags_words_stay BEFORE UPDATE ON flags
      WHEN OLD.text IS NOT NEW.text OR OLD.kind IS NOT NEW.kind OR OLD.personId IS NOT NEW.personId
        OR OLD.revisionId IS NOT NEW.revisionId OR OLD.stepId IS NOT NEW.stepId
      BEGIN SELECT RAISE(ABORT, 'What was flagged is never changed'); END`,
    `CREATE TRIGGER flags_end_once BEFORE UPDATE OF state ON flags WHEN OLD.state <> 'open' AND NEW.state <> OLD.state
      BEGIN SELECT RAISE(ABORT, 'A flag that has ended stays ended'); END`,
    `CREATE TRIGGER flags_kept BEFORE DELETE ON flags
      BEGIN SELECT RAISE(ABORT, 'A flag is never deleted'); END`,
  ],
  down: ['DROP TABLE flags'],
};
