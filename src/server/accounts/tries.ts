import { AsyncLocalStorage } from 'node:async_hooks';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { tooManyTries } from '../refusal';

const WINDOW = 15 * 60;
/** Wrong passwords for one account in a quarter of an hour. */
export const TRIES_BY_ACCOUNT = 10;
/** Wrong passwords from one address in a quarter of an hour; a shop's people share one. */
export const TRIES_BY_ADDRESS = 40;

// Counted in memory: one process serves a book, and a restart costs an attacker more than it gives.
const byAccount = new RateLimiterMemory({ keyPrefix: 'account', points: TRIES_BY_ACCOUNT, duration: WINDOW });
const byAddress = new RateLimiterMemory({ keyPrefix: 'address', points: TRIES_BY_ADDRESS, duration: WINDOW });

// Auth.js hands its `authorize` no client address, so the middleware leaves it here.
const addresses = new AsyncLocalStorage<string>();
export const fromAddress = <T>(address: string, fn: () => Promise<T>): Promise<T> => addresses.run(address, fn);

/**
 * Counts a try before the password is looked at, so that many at once are all counted; a right
 * password takes its own back. Throws 429 with the seconds to wait.
 */
export async function countTry(account: string): Promise<{ right(): Promise<void> }> {
  const address = addresses.getStore() ?? 'unknown';
  const key = account.trim().toLowerCase();
  try {
    await byAddress.consume(address);
    await byAccount.consume(key);
  } catch (limit) {
    if (!(limit instanceof RateLimiterRes)) throw limit;
    const minutes = Math.max(1, Math.ceil(limit.msBeforeNext / 60_000));
    throw tooManyTries(
      `Too many wrong passwords. Try again in ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}.`,
      Math.ceil(limit.msBeforeNext / 1000),
    );
  }
  return {
    async right() {
      await byAddress.reward(address);
      await byAccount.delete(key);
    },
  };
}
