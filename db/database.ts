import type { Sequelize, Transaction } from 'sequelize';
import type { Models } from './models/models';

export interface Database {
  sequelize: Sequelize;
  models: Models;
  /**
   * Runs `fn` in one IMMEDIATE transaction; all of it is stored or nothing is. Writers queue; a `write`
   * inside a `write` joins it. Throws `StorageBusy`, `StorageFull` or `RuleBroken` where SQLite refuses.
   */
  write<T>(fn: (transaction: Transaction) => Promise<T>): Promise<T>;
  /** One SELECT with `:named` replacements; rows as SQLite gives them (booleans 0 or 1, JSON as text). */
  read<Row extends object>(sql: string, replacements?: Record<string, unknown>): Promise<Row[]>;
  /**
   * A number that is another one after each commit, also of another process, so that what was read can be kept until it
   * changes. null inside a `write`, where what is read may not be committed.
   */
  state(): Promise<number | null>;
  close(): Promise<void>;
}
