import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { tooManyTries } from '../refusal';

/** Times a feed may be fetched in a quarter of an hour. A reader asks once or twice; pages of an old feed come in a row. */
export const FETCHES = 60;
/** Addresses without a feed that one place may ask for in a quarter of an hour. A key cannot be guessed; this is for the disk. */
export const MISSES = 60;

const WINDOW = 15 * 60;
const fetches = new RateLimiterMemory({ keyPrefix: 'feed', points: FETCHES, duration: WINDOW });
const misses = new RateLimiterMemory({ keyPrefix: 'no-feed', points: MISSES, duration: WINDOW });

async function count(limiter: RateLimiterMemory, whose: string): Promise<void> {
  try {
    await limiter.consume(whose);
  } catch (over) {
    if (!(over instanceof RateLimiterRes)) throw over;
    const wait = Math.max(1, Math.ceil(over.msBeforeNext / 1000));
    throw tooManyTries('The feed was asked for too often. Try again later.', wait);
  }
}

/** Counts one fetch of a feed; refuses 429 above the limit. */
export const countFetch = (feedId: string): Promise<void> => count(fetches, feedId);

/**
 * Counts one miss of a network address; refuses 429 above the limit. A key that opens a feed is not held up by it: a shop's
 * readers share an address, and one of them may go on asking with a key that was revoked.
 */
export const countMiss = (address: string): Promise<void> => count(misses, address);
