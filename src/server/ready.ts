import { isMigrated } from '@db/migrations/migrate';
import { lastKnown } from './audit/known';
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

/** What an operator should look at although the book can be used; no more than where, since anybody may ask. */
export async function readyWarnings(): Promise<string[]> {
  const known = await lastKnown();
  return known && known.faults.length > 0 ? ['audit: the trail does not hold; run npm run audit:check'] : [];
}
