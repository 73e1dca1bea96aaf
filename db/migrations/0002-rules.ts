import type { Migration } from './migration';

/**
 * The rules of review held by the database itself, so that no mistake above it can break them.
 * Each message is a sentence; it reaches the log, not the reader.
 */
const refuse = (name: string, when: string, message: string) =>
  `CREATE TRIGGER ${name} ${when} BEGIN SELECT RAISE(ABORT, '${message}'); END`;

const FROZEN = [
  'procedureId',
  'letter',
  'source',
  'hash',
  'parentId',
  'authorId',
  'reason',
  'proposedAt',
  'publishedAt',
];
const changed = FROZEN.map((column) => `OLD.${column} IS NOT NEW.${column}`).join(' OR ');

const isPublished = (row: 'OLD' | 'NEW') => `${row}.state IN ('published', 'superseded')`;
const byRelease = `(SELECT kind FROM people WHERE id = NEW.authorId) = 'release'`;
const agreed = `(SELECT count(DISTINCT a.personId) FROM agreements a
  WHERE a.revisionId = NEW.id AND a.hash = NEW.hash AND a.personId <> NEW.authorId
    AND a.base IS (SELECT letter FROM revisions WHERE id = NEW.parentId))`;

const triggers: Record<string, string> = {
  revisions_published_text_stays: `BEFORE UPDATE ON revisions WHEN ${isPublished('OLD')} AND (${changed})
    |A published revision never changes`,
  revisions_states_go_forward: `BEFORE UPDATE OF state ON revisions WHEN OLD.state <> NEW.state AND (
      OLD.state IN ('superseded', 'declined')
      OR (OLD.state = 'published' AND NEW.state <> 'superseded')
      OR (OLD.state <> 'published' AND NEW.state = 'superseded')
      OR (NEW.state IN ('published', 'declined', 'returned') AND OLD.state <> 'proposed'))
    |A revision cannot go from its state to that one`,
  revisions_publish_needs_agreement: `BEFORE UPDATE OF state ON revisions
    WHEN NEW.state = 'published' AND OLD.state = 'proposed'
      AND ${agreed} < CASE WHEN NEW.critical = 1 THEN 2 ELSE 1 END
    |A revision is published only with the agreements it needs`,
  revisions_born_published: `BEFORE INSERT ON revisions WHEN ${isPublished('NEW')} AND NOT ${byRelease}
    |Only a release enters the book as published`,
  revisions_once_proposed_stay: `BEFORE DELETE ON revisions WHEN OLD.everProposed = 1 OR ${isPublished('OLD')}
    |A revision that was proposed or published is never deleted`,
  revisions_parent_same_procedure: `BEFORE INSERT ON revisions
    WHEN NEW.parentId IS NOT NULL AND (SELECT procedureId FROM revisions WHERE id = NEW.parentId) IS NOT NEW.procedureId
    |A revision stands on a revision of its own procedure`,
  procedures_current_is_published: `BEFORE UPDATE OF currentRevisionId ON procedures
    WHEN NEW.currentRevisionId IS NOT NULL AND NOT EXISTS (SELECT 1 FROM revisions
      WHERE id = NEW.currentRevisionId AND procedureId = NEW.id AND state = 'published')
    |The current revision of a procedure is its published one`,
  procedures_number_and_book_stay: `BEFORE UPDATE OF number, bookKind, shopId ON procedures
    WHEN OLD.number IS NOT NEW.number OR OLD.bookKind IS NOT NEW.bookKind OR OLD.shopId IS NOT NEW.shopId
    |A procedure keeps its number and its book`,
  agreements_never_by_author: `BEFORE INSERT ON agreements
    WHEN (SELECT authorId FROM revisions WHERE id = NEW.revisionId) = NEW.personId
    |Nobody agrees to their own proposal`,
  agreements_to_proposed_text: `BEFORE INSERT ON agreements
    WHEN NOT EXISTS (SELECT 1 FROM revisions WHERE id = NEW.revisionId AND state = 'proposed' AND hash = NEW.hash)
    |An agreement is given to the text that is proposed`,
  agreements_stay: `BEFORE UPDATE ON agreements|An agreement is never changed`,
  agreements_kept: `BEFORE DELETE ON agreements|An agreement is never deleted`,
  remarks_stay: `BEFORE UPDATE ON remarks|A remark is never changed`,
  remarks_kept: `BEFORE DELETE ON remarks|A remark is never deleted`,
  auditEntries_stay: `BEFORE UPDATE ON auditEntries|The audit trail is never changed`,
  auditEntries_kept: `BEFORE DELETE ON auditEntries|The audit trail is never deleted`,
  auditEntries_chained: `BEFORE INSERT ON auditEntries
    WHEN NEW.previousHash <> ifnull((SELECT hash FROM auditEntries ORDER BY seq DESC LIMIT 1), '')
    |An audit entry names the hash of the one before it`,
};

export const rules: Migration = {
  name: '0002-rules',
  up: Object.entries(triggers).map(([name, rule]) => {
    const [when = '', message = ''] = rule.split('|');
    return refuse(name, when.trim(), message.trim());
  }),
  down: Object.keys(triggers).map((name) => `DROP TRIGGER ${name}`),
};
