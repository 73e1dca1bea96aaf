import { times, type Migration } from './migration';

/**
 * Records that are only ever added: `INSERT OR REPLACE` takes the old row away without asking the triggers that guard
 * deletion, so each table refuses a row that would take another's place, by its id or by what else is unique in it.
 */
const NEVER_REPLACED: Record<string, { same: string; message: string }> = {
  auditEntries: { same: 'seq = NEW.seq OR hash = NEW.hash', message: 'The audit trail is never written over' },
  revisions: {
    same: 'id = NEW.id OR (procedureId = NEW.procedureId AND letter = NEW.letter)',
    message: 'A revision is never written over',
  },
  agreements: {
    same: `id = NEW.id OR (revisionId = NEW.revisionId AND personId = NEW.personId AND hash = NEW.hash AND base IS NEW.base)`,
    message: 'An agreement is never written over',
  },
  clampOverrides: {
    same: `id = NEW.id OR (revisionId = NEW.revisionId AND hash = NEW.hash AND torqueKey = NEW.torqueKey AND personId = NEW.personId)`,
    message: 'An override is never written over',
  },
  remarks: { same: 'id = NEW.id', message: 'A remark is never written over' },
  bulletins: { same: 'id = NEW.id', message: 'A bulletin is never written over' },
  readAndSigned: {
    same: 'id = NEW.id OR (personId = NEW.personId AND bulletinId = NEW.bulletinId)',
    message: 'A signature is never written over',
  },
};

const trigger = (name: string, when: string, message: string) =>
  `CREATE TRIGGER ${name} ${when} BEGIN SELECT RAISE(ABORT, '${message}'); END`;

/** What the history of a sheet needs: a trail that is found by its subject, and what was worked out once for each revision. */
export const history: Migration = {
  name: '0014-history',
  up: [
    'CREATE INDEX auditEntries_by_subject ON auditEntries (subjectId, seq)',
    'CREATE INDEX auditEntries_by_shop ON auditEntries (shopId, seq) WHERE shopId IS NOT NULL',
    'CREATE INDEX readAndSigned_by_bulletin ON readAndSigned (bulletinId)',
    ...Object.entries(NEVER_REPLACED).map(([table, { same, message }]) =>
      trigger(
        `${table}_never_replaced`,
        `BEFORE INSERT ON ${table} WHEN EXISTS (SELECT 1 FROM ${table} WHERE ${same})`,
        message,
      ),
    ),
    // What changed between two texts, in words; worked out from the texts and thrown away without loss.
    `CREATE TABLE textChanges (
      fromHash TEXT NOT NULL,
      toHash TEXT NOT NULL,
      form INTEGER NOT NULL,
      json TEXT NOT NULL CHECK (json_valid(json)),${times},
      PRIMARY KEY (fromHash, toHash)
    ) WITHOUT ROWID`,
    // Since which revision each part of a published text reads so; as above.
    `CREATE TABLE textOrigins (
      revisionId TEXT PRIMARY KEY NOT NULL REFERENCES revisions (id),
      form INTEGER NOT NULL,
      json TEXT NOT NULL CHECK (json_valid(json)),${times}
    ) WITHOUT ROWID`,
  ],
  down: [
    'DROP TABLE textOrigins',
    'DROP TABLE textChanges',
    ...Object.keys(NEVER_REPLACED).map((table) => `DROP TRIGGER ${table}_never_replaced`),
    'DROP INDEX readAndSigned_by_bulletin',
    'DROP INDEX auditEntries_by_shop',
    'DROP INDEX auditEntries_by_subject',
  ],
};
