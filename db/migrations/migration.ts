/**
 * One change of the tables, as SQL statements. Never rebuild a table that others point at: with foreign
 * keys on, dropping it deletes its children. Use `ALTER TABLE` and new tables.
 */
export interface Migration {
  name: string;
  up: readonly string[];
  down: readonly string[];
}
