import { times, type Migration } from './migration';

/**
 * Keys of the feeds: one row a person and shop, whose id names the feed for ever; without a shop it is the common book
 * alone. Of the key only its SHA-256 is kept; null once it was revoked.
 */
export const feedKeys: Migration = {
  name: '0015-feed-keys',
  up: [
    `CREATE TABLE feedKeys (
      id TEXT PRIMARY KEY NOT NULL,
      personId TEXT NOT NULL REFERENCES people (id),
      shopId TEXT REFERENCES shops (id),
      keyHash TEXT UNIQUE CHECK (length(keyHash) = 64 AND keyHash NOT GLOB '*[^0-9a-f]*'),
      madeAt TEXT NOT NULL,${times}
    )`,
    `CREATE UNIQUE INDEX feedKeys_once ON feedKeys (personId, ifnull(shopId, ''))`,
    `CREATE TRIGGER feedKeys_stay_whose BEFORE UPDATE ON feedKeys
      WHEN OLD.id IS NOT NEW.id OR OLD.personId IS NOT NEW.personId OR OLD.shopId IS NOT NEW.shopId
      BEGIN SELECT RAISE(ABORT, 'A feed never goes over to another person or shop'); END`,
  ],
  down: ['DROP TABLE feedKeys'],
};
