import { times, type Migration } from './migration';

/** Notices that reach every reader of a book, who has read them, and what a withdrawal forbids. */
export const bulletins: Migration = {
  name: '0009-bulletins',
  up: [
    `CREATE TABLE bulletins (
      id TEXT PRIMARY KEY NOT NULL,
      kind TEXT NOT NULL CHECK (kind IN ('withdrawn', 'brought back', 'critical change')),
      procedureId TEXT NOT NULL REFERENCES procedures (id),
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      shopId TEXT REFERENCES shops (id),
      words JSON NOT NULL CHECK (json_valid(words) AND json_array_length(words) > 0),
      byId TEXT NOT NULL REFERENCES people (id),
      at TEXT NOT NULL,${times}
    )`,
    `CREATE INDEX bulletins_by_procedure ON bulletins (procedureId, at)`,
    `CREATE UNIQUE INDEX bulletins_one_change ON bulletins (revisionId) WHERE kind = 'critical change'`,
    `CREATE TABLE readAndSigned (
      id TEXT PRIMARY KEY NOT NULL,
      personId TEXT NOT NULL REFERENCES people (id),
      bulletinId TEXT NOT NULL REFERENCES bulletins (id),
      at TEXT NOT NULL,${times},
      UNIQUE (personId, bulletinId)
    )`,
    ...Object.entries({
      bulletins_stay: `BEFORE UPDATE ON bulletins|A bulletin is never changed`,
      bulletins_kept: `BEFORE DELETE ON bulletins|A bulletin is never deleted`,
      bulletins_in_their_book: `BEFORE INSERT ON bulletins
        WHEN NEW.shopId IS NOT (SELECT shopId FROM procedures WHERE id = NEW.procedureId)
        |A bulletin stands in the book of its procedure`,
      bulletins_of_the_current: `BEFORE INSERT ON bulletins
        WHEN NEW.revisionId IS NOT (SELECT currentRevisionId FROM procedures WHERE id = NEW.procedureId)
        |A bulletin is about the published revision`,
      readAndSigned_stay: `BEFORE UPDATE ON readAndSigned|A signature is never changed`,
      readAndSigned_kept: `BEFORE DELETE ON readAndSigned|A signature is never deleted`,
      procedures_withdrawn_with_a_word: `BEFORE UPDATE OF withdrawnAt ON procedures
        WHEN NEW.withdrawnAt IS NOT OLD.withdrawnAt AND NOT EXISTS (SELECT 1 FROM bulletins
          WHERE procedureId = NEW.id AND ((kind = 'withdrawn' AND at = NEW.withdrawnAt)
            OR (kind = 'brought back' AND NEW.withdrawnAt IS NULL AND at >= OLD.withdrawnAt)))
        |A procedure is withdrawn and brought back with a bulletin`,
      revisions_withdrawn_waits: `BEFORE UPDATE OF state ON revisions
        WHEN NEW.state = 'published' AND OLD.state <> 'published'
          AND (SELECT withdrawnAt FROM procedures WHERE id = NEW.procedureId) IS NOT NULL
        |Nothing is published on a withdrawn procedure`,
    }).map(([name, rule]) => {
      const [when = '', message = ''] = rule.split('|');
      return `CREATE TRIGGER ${name} ${when.trim()} BEGIN SELECT RAISE(ABORT, '${message.trim()}'); END`;
    }),
  ],
  down: [
    'DROP TRIGGER revisions_withdrawn_waits',
    'DROP TRIGGER procedures_withdrawn_with_a_word',
    'DROP TABLE readAndSigned',
    'DROP TABLE bulletins',
    'UPDATE procedures SET withdrawnAt = NULL',
  ],
};
