import { times, type Migration } from './migration';

/**
 * Overrides of a failed clamp check. A revision keeps which of its torques fail, as `[{key, name, share}]`; null where
 * that was never judged, as in a revision older than this migration. Each override is to one text and one torque.
 */

const failing = (row: string) => `json_each(${row}.failingTorques)`;
const key = `json_extract(f.value, '$.key')`;

/** Whether a person holds one of these roles in the book that revision `NEW.revisionId` belongs to. */
const inTheBook = (ofShop: string) => `EXISTS (
    SELECT 1 FROM revisions r JOIN procedures p ON p.id = r.procedureId JOIN memberships m ON m.personId = NEW.personId
    WHERE r.id = NEW.revisionId AND CASE p.bookKind
      WHEN 'common' THEN m.scope = 'common' AND m.role = 'editor'
      ELSE m.scope = 'shop' AND m.shopId = p.shopId AND m.role IN (${ofShop}) END)`;

const triggers: Record<string, string> = {
  clampOverrides_never_by_author: `BEFORE INSERT ON clampOverrides
    WHEN (SELECT authorId FROM revisions WHERE id = NEW.revisionId) = NEW.personId
    |Nobody overrides the clamp check of their own proposal`,
  clampOverrides_by_an_editor: `BEFORE INSERT ON clampOverrides WHEN NOT ${inTheBook(`'editor'`)}
    |The clamp check is overridden by an editor of the book`,
  clampOverrides_to_proposed_text: `BEFORE INSERT ON clampOverrides
    WHEN NOT EXISTS (SELECT 1 FROM revisions r, ${failing('r')} f
      WHERE r.id = NEW.revisionId AND r.state = 'proposed' AND r.hash = NEW.hash AND ${key} = NEW.torqueKey)
    |An override is given to a failing torque of the text that is proposed`,
  clampOverrides_stay: `BEFORE UPDATE ON clampOverrides|An override is never changed`,
  clampOverrides_kept: `BEFORE DELETE ON clampOverrides|An override is never deleted`,
  agreements_by_the_books_people: `BEFORE INSERT ON agreements WHEN NOT ${inTheBook(`'editor', 'senior', 'owner'`)}
    |An agreement is given by somebody who answers for the book`,
  revisions_publish_needs_overrides: `BEFORE UPDATE OF state ON revisions
    WHEN NEW.state = 'published' AND OLD.state = 'proposed' AND (NEW.failingTorques IS NULL
      OR EXISTS (SELECT 1 FROM ${failing('NEW')} f WHERE NOT EXISTS (SELECT 1 FROM clampOverrides o
        WHERE o.revisionId = NEW.id AND o.hash = NEW.hash AND o.torqueKey = ${key} AND o.personId <> NEW.authorId)))
    |A revision is published only with an override of each failed clamp check`,
  revisions_born_within_proof: `BEFORE INSERT ON revisions
    WHEN NEW.state IN ('published', 'superseded') AND json_array_length(NEW.failingTorques) > 0
    |A text that fails the clamp check does not enter the book unreviewed`,
  revisions_failing_torques_stay: `BEFORE UPDATE OF failingTorques ON revisions
    WHEN OLD.state NOT IN ('draft', 'returned') AND OLD.failingTorques IS NOT NULL
      AND OLD.failingTorques IS NOT NEW.failingTorques AND OLD.hash = NEW.hash AND OLD.parentId IS NEW.parentId
    |Which torques of a text fail changes only with the text`,
};

const refuse = ([name, rule]: [string, string]) => {
  const [when = '', message = ''] = rule.split('|');
  return `CREATE TRIGGER ${name} ${when.trim()} BEGIN SELECT RAISE(ABORT, '${message.trim()}'); END`;
};

export const clampOverrides: Migration = {
  name: '0007-clamp-overrides',
  up: [
    `ALTER TABLE revisions ADD COLUMN failingTorques JSON DEFAULT NULL
      CHECK (failingTorques IS NULL OR json_type(failingTorques) = 'array')`,
    `CREATE TABLE clampOverrides (
      id TEXT PRIMARY KEY NOT NULL,
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      hash TEXT NOT NULL,
      torqueKey TEXT NOT NULL,
      personId TEXT NOT NULL REFERENCES people (id),
      reason TEXT NOT NULL CHECK (length(trim(reason, ' ' || char(9, 10, 13))) > 0),
      share REAL NOT NULL CHECK (typeof(share) = 'real' AND share > 1),
      at TEXT NOT NULL,${times},
      UNIQUE (revisionId, hash, torqueKey, personId)
    )`,
    ...Object.entries(triggers).map(refuse),
  ],
  down: [
    ...Object.keys(triggers).map((name) => `DROP TRIGGER ${name}`),
    'DROP TABLE clampOverrides',
    'ALTER TABLE revisions DROP COLUMN failingTorques',
  ],
};
