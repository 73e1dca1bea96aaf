import { times, type Migration } from './migration';

/** Versions of a draft to go back to. They are let go as they grow old, but what was sent in stays for as long as its draft. */
export const draftVersions: Migration = {
  name: '0011-draft-versions',
  up: [
    `CREATE TABLE draftVersions (
      id TEXT PRIMARY KEY NOT NULL,
      revisionId TEXT NOT NULL REFERENCES revisions (id) ON DELETE CASCADE,
      n INTEGER NOT NULL CHECK (n > 0),
      kind TEXT NOT NULL CHECK (kind IN ('start', 'write', 'submit', 'return', 'restore', 'merge', 'suggestion', 'aside')),
      ofN INTEGER,
      personId TEXT NOT NULL REFERENCES people (id),
      at TEXT NOT NULL,
      sittingAt TEXT NOT NULL,
      page TEXT,
      parentId TEXT REFERENCES revisions (id),
      reason TEXT NOT NULL,
      hash TEXT NOT NULL,
      packed BLOB NOT NULL,
      what JSON NOT NULL DEFAULT '[]',${times},
      UNIQUE (revisionId, n),
      CHECK ((kind = 'restore') = (ofN IS NOT NULL))
    )`,
    `CREATE TRIGGER draftVersions_text_stays BEFORE UPDATE ON draftVersions
      WHEN OLD.revisionId IS NOT NEW.revisionId OR OLD.n IS NOT NEW.n OR OLD.kind IS NOT NEW.kind OR OLD.personId IS NOT NEW.personId
        OR OLD.at IS NOT NEW.at OR OLD.parentId IS NOT NEW.parentId OR OLD.reason IS NOT NEW.reason OR OLD.hash IS NOT NEW.hash
        OR OLD.packed IS NOT NEW.packed
      BEGIN SELECT RAISE(ABORT, 'A version of a draft never changes'); END`,
    // Where the draft itself is thrown away its row is gone by now.
    `CREATE TRIGGER draftVersions_first_and_sent_in_stay BEFORE DELETE ON draftVersions
      WHEN (OLD.n = 1 OR OLD.kind = 'submit') AND EXISTS (SELECT 1 FROM revisions WHERE id = OLD.revisionId)
      BEGIN SELECT RAISE(ABORT, 'The first version of a draft and what was sent in are kept with it'); END`,
  ],
  down: ['DROP TABLE draftVersions'],
};
