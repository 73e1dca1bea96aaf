import { BaseError } from 'sequelize';

/** Somebody else holds the database; nothing was written. Try again shortly. */
export class StorageBusy extends Error {
  override name = 'StorageBusy';
}

/** The disk is full or fails; nothing was written. Trying again does not help until an operator acts. */
export class StorageFull extends Error {
  override name = 'StorageFull';
}

/** A rule that the database itself holds was broken; the message is the rule in words. */
export class RuleBroken extends Error {
  override name = 'RuleBroken';
}

const FULL = /^SQLITE_(FULL|IOERR|READONLY|CANTOPEN)/;
const BUSY = /^SQLITE_(BUSY|LOCKED)/;

/** The code and the words that SQLite gave, looked for beneath what Sequelize wraps around them. */
function sqliteFault(error: unknown): { code: string; message: string } | null {
  for (let e: unknown = error, depth = 0; e instanceof Error && depth < 4; depth++) {
    const { code, parent } = e as Error & { code?: unknown; parent?: unknown };
    if (typeof code === 'string' && code.startsWith('SQLITE_')) return { code, message: e.message };
    e = e instanceof BaseError ? parent : undefined;
  }
  return null;
}

/** Turns what Sequelize throws into the three faults that callers act on; all else is returned as it is. */
export function storageFault(error: unknown): unknown {
  const fault = sqliteFault(error);
  if (!fault) return error;
  if (BUSY.test(fault.code)) return new StorageBusy('The book is busy. Try again in a moment.', { cause: error });
  if (FULL.test(fault.code))
    return new StorageFull('The book cannot be written: the disk is full or fails.', { cause: error });
  // Sequelize reports every constraint as a unique one; only a real one keeps that name.
  if (fault.code.startsWith('SQLITE_CONSTRAINT') && !/UNIQUE constraint|FOREIGN KEY/.test(fault.message))
    return new RuleBroken(fault.message.replace(/^SQLITE_CONSTRAINT(_\w+)?: /, ''), { cause: error });
  return error;
}
