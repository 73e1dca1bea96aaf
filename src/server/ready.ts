import { isMigrated } from '@db/migrations/migrate';
import { app } from './context';
import { startOnce } from './start';

/** Whether the book is open, up to date and answering. A reason why not goes to the log, not to the caller. */
export async function isReady(): Promise<boolean> {
  try {
    await startOnce();
    const { db } = await app();
    return await isMigrated(db);
  } catch (error) {
    console.error('not ready', error);
    return false;
  }
}
