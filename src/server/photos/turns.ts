import { availableParallelism } from 'node:os';
import { Refusal } from '../refusal';

/** Waiting longer than this many others take is no use to anybody. */
const MOST_IN_LINE = 24;

/**
 * Few at once: pictures take seconds of a processor, and whoever looks a sheet up must not wait for them. The rest stands in
 * line; where the line is long, 503 with `Retry-After`.
 */
export function turns(atOnce: number, mostInLine = MOST_IN_LINE) {
  const line: (() => void)[] = [];
  let running = 0;
  return async <T>(act: () => Promise<T>): Promise<T> => {
    if (running >= atOnce) {
      if (line.length >= mostInLine)
        throw new Refusal(
          503,
          'busy',
          'Busy',
          'Many photos are being worked on. Nothing was kept; try again in a moment.',
          {
            headers: { 'Retry-After': '5' },
          },
        );
      await new Promise<void>((go) => line.push(go));
    } else running += 1;
    try {
      return await act();
    } finally {
      const next = line.shift();
      // The turn is handed on, so that nobody who comes meanwhile gets ahead.
      if (next) next();
      else running -= 1;
    }
  };
}

/** One processor stays free for everything else; a machine with one has no choice. */
export const inTurn = turns(Math.min(2, Math.max(1, availableParallelism() - 1)));
