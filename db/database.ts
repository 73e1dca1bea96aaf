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
  close(): Promise<void>;
}
