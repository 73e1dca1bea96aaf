/**
 * One change of the tables, as SQL statements. Never rebuild a table that others point at: with foreign
 * keys on, dropping it deletes its children. Use `ALTER TABLE` and new tables.
 */
export interface Migration {
  name: string;
  up: readonly string[];
  down: readonly string[];
}

// Every time is ISO 8601 text in UTC, every id a UUIDv7, every boolean 0 or 1. Sequelize reads the
// declared types JSON and TINYINT back as objects and booleans.
export const times = `
  createdAt TEXT NOT NULL DEFAULT (strftime('%Y-%m-%dT%H:%M:%fZ', 'now')),
  updatedAt TEXT NOT NULL DEFAULT (strftime('%Y-%m-%dT%H:%M:%fZ', 'now'))`;
