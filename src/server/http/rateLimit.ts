import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { tooManyTries } from '../refusal';

/**
 * Calls a person may make in a minute: far above what a form that saves by itself makes, far below a loop gone wild. A photo
 * takes a second of a processor.
 */
export const PER_MINUTE = { changing: 600, reading: 12_000, photos: 60 } as const;

const limiters = {
  changing: new RateLimiterMemory({ points: PER_MINUTE.changing, duration: 60 }),
  reading: new RateLimiterMemory({ points: PER_MINUTE.reading, duration: 60 }),
  photos: new RateLimiterMemory({ points: PER_MINUTE.photos, duration: 60 }),
};

/** Counts one call of a person; refuses 429, with the seconds to wait, above the limit. */
export async function countCall(personId: string, kind: keyof typeof PER_MINUTE): Promise<void> {
  try {
    await limiters[kind].consume(personId);
  } catch (over) {
    if (!(over instanceof RateLimiterRes)) throw over;
    const wait = Math.max(1, Math.ceil(over.msBeforeNext / 1000));
    throw tooManyTries(`Too many calls. Wait ${wait} ${wait === 1 ? 'second' : 'seconds'}, then try again.`, wait);
  }
}
