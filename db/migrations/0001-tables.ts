import { times, type Migration } from './migration';

export const tables: Migration = {
  name: '0001-tables',
  up: [
    `CREATE TABLE shops (
      id TEXT PRIMARY KEY NOT NULL,
      name TEXT NOT NULL UNIQUE COLLATE NOCASE CHECK (length(trim(name)) > 0),
      demonstration TINYINT NOT NULL DEFAULT 0 CHECK (demonstration IN (0, 1)),${times}
    )`,

    // A release is the author of what came with the product; it has no e-mail and no password and never signs in.
    `CREATE TABLE people (
      id TEXT PRIMARY KEY NOT NULL,
      kind TEXT NOT NULL DEFAULT 'person' CHECK (kind IN ('person', 'release')),
      email TEXT UNIQUE COLLATE NOCASE CHECK (email LIKE '_%@_%'),
      name TEXT NOT NULL CHECK (length(trim(name)) > 0),
      passwordHash TEXT,
      tokenVersion INTEGER NOT NULL DEFAULT 1,
      units TEXT NOT NULL DEFAULT 'metric' CHECK (units IN ('metric', 'inch')),
      currentShopId TEXT REFERENCES shops (id),
      demonstration TINYINT NOT NULL DEFAULT 0 CHECK (demonstration IN (0, 1)),${times},
      CHECK ((kind = 'person') = (email IS NOT NULL)),
      CHECK (kind = 'person' OR passwordHash IS NULL)
    )`,

    `CREATE TABLE memberships (
      id TEXT PRIMARY KEY NOT NULL,
      personId TEXT NOT NULL REFERENCES people (id),
      scope TEXT NOT NULL,
      shopId TEXT REFERENCES shops (id),
      role TEXT NOT NULL,${times},
      CHECK ((scope = 'shop' AND shopId IS NOT NULL AND role IN ('apprentice', 'technician', 'senior', 'editor', 'owner'))
        OR (scope = 'common' AND shopId IS NULL AND role = 'editor')
        OR (scope = 'network' AND shopId IS NULL AND role = 'steward'))
    )`,
    `CREATE UNIQUE INDEX memberships_once ON memberships (personId, scope, ifnull(shopId, ''), role)`,

    `CREATE TABLE procedures (
      id TEXT PRIMARY KEY NOT NULL,
      number TEXT NOT NULL UNIQUE CHECK (number GLOB 'P-[0-9][0-9][0-9][0-9]*'),
      bookKind TEXT NOT NULL CHECK (bookKind IN ('common', 'shop')),
      shopId TEXT REFERENCES shops (id),
      currentRevisionId TEXT REFERENCES revisions (id),
      withdrawnAt TEXT,${times},
      CHECK ((bookKind = 'shop') = (shopId IS NOT NULL))
    )`,

    `CREATE TABLE revisions (
      id TEXT PRIMARY KEY NOT NULL,
      procedureId TEXT NOT NULL REFERENCES procedures (id),
      letter TEXT CHECK (length(letter) BETWEEN 1 AND 2 AND letter NOT GLOB '*[^A-HJ-NPRT-WY]*'),
      state TEXT NOT NULL CHECK (state IN ('draft', 'proposed', 'returned', 'declined', 'published', 'superseded')),
      parentId TEXT REFERENCES revisions (id),
      source TEXT NOT NULL,
      hash TEXT NOT NULL CHECK (length(hash) = 64 AND hash NOT GLOB '*[^0-9a-f]*'),
      head JSON CHECK (json_valid(head)),
      authorId TEXT NOT NULL REFERENCES people (id),
      reason TEXT NOT NULL DEFAULT '',
      critical TINYINT NOT NULL DEFAULT 0 CHECK (critical IN (0, 1)),
      criticalReasons JSON NOT NULL DEFAULT '[]' CHECK (json_valid(criticalReasons)),
      version INTEGER NOT NULL DEFAULT 1 CHECK (version >= 1),
      everProposed TINYINT NOT NULL DEFAULT 0 CHECK (everProposed IN (0, 1)),
      proposedAt TEXT,
      publishedAt TEXT,${times},
      UNIQUE (procedureId, letter),
      CHECK ((letter IS NOT NULL) = (state IN ('published', 'superseded'))),
      CHECK ((publishedAt IS NOT NULL) = (state IN ('published', 'superseded'))),
      CHECK (head IS NOT NULL OR state IN ('draft', 'returned')),
      CHECK (everProposed = 1 OR state IN ('draft', 'published', 'superseded')),
      CHECK (parentId IS NOT id)
    )`,
    `CREATE UNIQUE INDEX revisions_one_current ON revisions (procedureId) WHERE state = 'published'`,
    `CREATE INDEX revisions_by_author ON revisions (authorId, state)`,
    `CREATE INDEX revisions_by_state ON revisions (state, procedureId)`,
    `CREATE INDEX revisions_by_hash ON revisions (hash)`,

    `CREATE TABLE renderings (
      hash TEXT PRIMARY KEY NOT NULL,
      form INTEGER NOT NULL,
      json TEXT NOT NULL CHECK (json_valid(json)),${times}
    )`,

    `CREATE TABLE agreements (
      id TEXT PRIMARY KEY NOT NULL,
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      personId TEXT NOT NULL REFERENCES people (id),
      hash TEXT NOT NULL,
      base TEXT,
      at TEXT NOT NULL,${times}
    )`,
    `CREATE UNIQUE INDEX agreements_once ON agreements (revisionId, personId, hash, ifnull(base, ''))`,

    `CREATE TABLE remarks (
      id TEXT PRIMARY KEY NOT NULL,
      revisionId TEXT NOT NULL REFERENCES revisions (id),
      personId TEXT NOT NULL REFERENCES people (id),
      kind TEXT NOT NULL CHECK (kind IN ('returned', 'declined')),
      text TEXT NOT NULL CHECK (length(trim(text)) > 0),
      anchor TEXT,
      at TEXT NOT NULL,${times}
    )`,
    `CREATE INDEX remarks_by_revision ON remarks (revisionId, at)`,

    `CREATE TABLE auditEntries (
      seq INTEGER PRIMARY KEY AUTOINCREMENT,
      at TEXT NOT NULL,
      actorId TEXT REFERENCES people (id),
      act TEXT NOT NULL,
      subjectType TEXT NOT NULL,
      subjectId TEXT NOT NULL,
      shopId TEXT REFERENCES shops (id),
      detail JSON NOT NULL CHECK (json_valid(detail)),
      previousHash TEXT NOT NULL,
      hash TEXT NOT NULL UNIQUE CHECK (length(hash) = 64),${times}
    )`,

    `CREATE TABLE searchDocuments (
      procedureId TEXT PRIMARY KEY NOT NULL REFERENCES procedures (id),
      book TEXT NOT NULL,
      hash TEXT NOT NULL,
      json TEXT NOT NULL CHECK (json_valid(json)),${times}
    )`,
    `CREATE INDEX searchDocuments_by_book ON searchDocuments (book, updatedAt)`,
    `CREATE VIRTUAL TABLE searchWords USING fts5 (procedureId UNINDEXED, words, tokenize = 'unicode61 remove_diacritics 2', prefix = '2 3')`,

    `CREATE TABLE settings (key TEXT PRIMARY KEY NOT NULL, value TEXT NOT NULL,${times})`,

    `CREATE TABLE idempotencyKeys (
      personId TEXT NOT NULL REFERENCES people (id),
      key TEXT NOT NULL CHECK (length(key) BETWEEN 1 AND 200),
      request TEXT NOT NULL,
      status INTEGER NOT NULL,
      headers JSON NOT NULL DEFAULT '{}' CHECK (json_valid(headers)),
      body TEXT NOT NULL,${times},
      PRIMARY KEY (personId, key)
    ) WITHOUT ROWID`,
    `CREATE INDEX idempotencyKeys_by_age ON idempotencyKeys (createdAt)`,
  ],
  down: [
    'DROP TABLE idempotencyKeys',
    'DROP TABLE settings',
    'DROP TABLE searchWords',
    'DROP TABLE searchDocuments',
    'DROP TABLE auditEntries',
    'DROP TABLE remarks',
    'DROP TABLE agreements',
    'DROP TABLE renderings',
    'UPDATE procedures SET currentRevisionId = NULL',
    'UPDATE revisions SET parentId = NULL',
    'DROP TABLE revisions',
    'DROP TABLE procedures',
    'DROP TABLE memberships',
    'DROP TABLE people',
    'DROP TABLE shops',
  ],
};
