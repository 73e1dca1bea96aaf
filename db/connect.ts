import { ConnectionError, QueryTypes, Sequelize, Transaction } from 'sequelize';
import sqlite3 from 'sqlite3';
import type { Database } from './database';
import { migrate } from './migrations/migrate';
import { defineModels } from './models/models';
import { StorageBusy, storageFault } from './storageErrors';
import { currentTransaction } from './transactions';

/** How long a writer waits for its turn, and SQLite for a lock of another process, in milliseconds. */
const BUSY_AFTER = 5000;

export interface OpenOptions {
  /** Time written into `createdAt` and `updatedAt`, ISO 8601 in UTC; the wall clock unless given. */
  now?: () => string;
}

/** Sequelize's own hooks never fire for SQLite, and each transaction opens a connection: set each one up here. */
class Connection extends sqlite3.Database {
  constructor(file: string, mode: number, opened: (error: Error | null) => void) {
    super(file, mode, opened);
    this.serialize();
    this.configure('busyTimeout', BUSY_AFTER);
    this.exec('PRAGMA foreign_keys = ON; PRAGMA synchronous = FULL;');
  }
}

function connection(file: string): Sequelize {
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    dialectModule: { ...sqlite3, Database: Connection },
    storage: file,
    logging: false,
    retry: { max: 1 },
  });
  const manager = (sequelize as unknown as { connectionManager: Manager }).connectionManager;
  // Called after a COMMIT or ROLLBACK failed. The inherited one looks in a pool that SQLite does not use,
  // and so would leave the connection open, holding the write lock.
  manager.destroyConnection = (broken) =>
    new Promise((resolve) => {
      broken.run('ROLLBACK', () => {
        manager.releaseConnection(broken, true);
        resolve();
      });
    });
  return sequelize;
}

interface Manager {
  destroyConnection(connection: sqlite3.Database): Promise<void>;
  releaseConnection(connection: sqlite3.Database, force: boolean): void;
}

/** Lets one writer in at a time, in the order they came; a writer that waits too long is turned away. */
function turnstile() {
  let last: Promise<unknown> = Promise.resolve();
  return <T>(fn: () => Promise<T>): Promise<T> => {
    const asked = Date.now();
    const turn = last.then(() => {
      if (Date.now() - asked > BUSY_AFTER) throw new StorageBusy('The book is busy. Try again in a moment.');
      return fn();
    });
    last = turn.catch(() => undefined);
    return turn;
  };
}

/** Opens the database, made if it is missing, in write-ahead mode and brought up to date. */
export async function openDatabase(file: string, { now = isoNow }: OpenOptions = {}): Promise<Database> {
  const sequelize = connection(file);
  const models = defineModels(sequelize, now);
  const oneAtATime = turnstile();
  let closed = false;

  const db: Database = {
    sequelize,
    models,
    async write(fn) {
      const open = currentTransaction(sequelize);
      if (open) return fn(open);
      try {
        return await oneAtATime(() => sequelize.transaction({ type: Transaction.TYPES.IMMEDIATE }, fn));
      } catch (error) {
        throw storageFault(error);
      }
    },
    async read<Row extends object>(sql: string, replacements: Record<string, unknown> = {}) {
      try {
        return await sequelize.query<Row>(sql, { type: QueryTypes.SELECT, replacements: wholeStrings(replacements) });
      } catch (error) {
        throw storageFault(error);
      }
    },
    async state() {
      if (currentTransaction(sequelize)) return null;
      // It tells of commits on other connections than the one that asks; every commit is on one of its own.
      const [row] = await db.read<{ data_version: number }>('PRAGMA data_version');
      return row?.data_version ?? null;
    },
    close: async () => {
      // Sequelize fails when it is closed twice, and a caller that cleans up need not know who came first.
      if (!closed) await sequelize.close();
      closed = true;
    },
  };

  try {
    await sequelize.query('PRAGMA journal_mode = WAL');
    await migrate(db);
  } catch (error) {
    // A connection that never opened never finishes closing either.
    if (!(error instanceof ConnectionError)) await sequelize.close();
    throw storageFault(error);
  }
  return db;
}

/** A NUL ends a statement for SQLite, wherever it stands; a text that holds one matches nothing instead. */
const wholeStrings = (replacements: Record<string, unknown>): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(replacements).map(([name, value]) => [
      name,
      typeof value === 'string' ? value.replaceAll('\0', '\ufffd') : value,
    ]),
  );

const isoNow = () => new Date().toISOString();
