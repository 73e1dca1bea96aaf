import { times, type Migration } from './migration';

/** What a new procedure was begun from: a sheet that was copied, or a document with what it could not be taken over. */
export const origins: Migration = {
  name: '0013-origins',
  up: [
    `CREATE TABLE origins (
      procedureId TEXT PRIMARY KEY NOT NULL REFERENCES procedures (id) ON DELETE CASCADE,
      json TEXT NOT NULL CHECK (json_valid(json)),${times}
    )`,
    `CREATE TRIGGER origins_stay BEFORE UPDATE ON origins
      BEGIN SELECT RAISE(ABORT, 'What a procedure was begun from is never changed'); END`,
  ],
  down: ['DROP TABLE origins'],
};
