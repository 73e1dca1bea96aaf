import { times, type Migration } from './migration';

const same = (columns: string[]) => columns.map((column) => `OLD.${column} IS NOT NEW.${column}`).join(' OR ');

/** A reason that was not sent in since the photo was put to it: nobody but its author has seen it. */
const unsent = `(OLD.subjectType = 'proposal' AND EXISTS (SELECT 1 FROM revisions r WHERE r.id = OLD.subjectId
  AND r.state IN ('draft', 'returned') AND (r.proposedAt IS NULL OR OLD.attachedAt > r.proposedAt)))`;

/** What a photo is sent with is there and is of whoever sends it. A new kind of subject gets a line here. */
const theirs = `CASE NEW.subjectType
  WHEN 'message' THEN EXISTS (SELECT 1 FROM threadMessages WHERE id = NEW.subjectId AND personId = NEW.uploaderId)
  WHEN 'flag' THEN EXISTS (SELECT 1 FROM flags WHERE id = NEW.subjectId AND personId = NEW.uploaderId)
  WHEN 'proposal' THEN EXISTS (SELECT 1 FROM revisions
    WHERE id = NEW.subjectId AND authorId = NEW.uploaderId AND state IN ('draft', 'returned'))
  ELSE 0 END`;

/**
 * Photos as evidence: uploaded first, then sent with a message, a flag or a reason. The picture lies in the file store under
 * the id; one that was removed leaves its row, with who removed it and why.
 */
export const photos: Migration = {
  name: '0012-photos',
  up: [
    `CREATE TABLE attachments (
      id TEXT PRIMARY KEY NOT NULL,
      uploaderId TEXT NOT NULL REFERENCES people (id),
      subjectType TEXT,
      subjectId TEXT,
      place INTEGER NOT NULL DEFAULT 0 CHECK (place >= 0),
      alt TEXT NOT NULL DEFAULT '' CHECK (length(alt) <= 200),
      width INTEGER NOT NULL CHECK (width > 0),
      height INTEGER NOT NULL CHECK (height > 0),
      bytes INTEGER NOT NULL CHECK (bytes > 0),
      hash TEXT NOT NULL CHECK (length(hash) = 64),
      at TEXT NOT NULL,
      attachedAt TEXT,
      removedById TEXT REFERENCES people (id),
      removedAt TEXT,
      removedWhy TEXT,${times},
      CHECK (width * height <= 12000000),
      CHECK ((subjectType IS NULL) = (subjectId IS NULL) AND (subjectType IS NULL) = (attachedAt IS NULL)),
      CHECK (subjectType IS NULL OR length(trim(alt)) > 0),
      CHECK ((removedAt IS NULL) = (removedById IS NULL) AND (removedAt IS NULL) = (removedWhy IS NULL)),
      CHECK (removedAt IS NULL OR (subjectType IS NOT NULL AND length(trim(removedWhy)) > 0))
    )`,
    'CREATE UNIQUE INDEX attachments_by_subject ON attachments (subjectType, subjectId, place) WHERE subjectId IS NOT NULL',
    'CREATE INDEX attachments_unsent ON attachments (at, uploaderId) WHERE subjectId IS NULL',
    ...Object.entries({
      attachments_born_unsent: `BEFORE INSERT ON attachments WHEN NEW.subjectId IS NOT NULL
        |A photo is uploaded first and sent afterwards`,
      attachments_picture_stays: `BEFORE UPDATE ON attachments WHEN ${same(['uploaderId', 'width', 'height', 'bytes', 'hash', 'at'])}
        |A photo is never changed`,
      attachments_sent_once: `BEFORE UPDATE ON attachments WHEN OLD.subjectId IS NOT NULL
          AND (${same(['subjectType', 'subjectId', 'place', 'alt', 'attachedAt'])})
        |A photo that was sent stays with what it was sent with`,
      attachments_sent_with_ones_own: `BEFORE UPDATE ON attachments
        WHEN OLD.subjectId IS NULL AND NEW.subjectId IS NOT NULL AND NOT (${theirs})
        |A photo is sent with something of whoever uploaded it`,
      attachments_six_at_most: `BEFORE UPDATE ON attachments WHEN OLD.subjectId IS NULL AND NEW.subjectId IS NOT NULL
          AND (SELECT count(*) FROM attachments WHERE subjectType = NEW.subjectType AND subjectId = NEW.subjectId
            AND removedAt IS NULL) >= 6
        |Nothing has more than six photos`,
      attachments_removed_once: `BEFORE UPDATE ON attachments WHEN OLD.removedAt IS NOT NULL
          AND (${same(['removedById', 'removedAt', 'removedWhy'])})
        |What was removed stays removed`,
      attachments_kept: `BEFORE DELETE ON attachments WHEN OLD.subjectId IS NOT NULL AND NOT ${unsent}
        |A photo that was sent is never deleted`,
      attachments_before_their_draft: `BEFORE DELETE ON revisions
        WHEN EXISTS (SELECT 1 FROM attachments WHERE subjectType = 'proposal' AND subjectId = OLD.id)
        |The photos of a draft are deleted before it`,
    }).map(([name, rule]) => {
      const [when = '', message = ''] = rule.split('|');
      return `CREATE TRIGGER ${name} ${when.trim()} BEGIN SELECT RAISE(ABORT, '${message.trim()}'); END`;
    }),
  ],
  down: ['DROP TRIGGER attachments_before_their_draft', 'DROP TABLE attachments'],
};
