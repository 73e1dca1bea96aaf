import { AsyncLocalStorage } from 'node:async_hooks';

// Chapters of the demonstration's history are acted out by the real use cases, at their own dates.
const held = globalThis as { matchmarkClock?: AsyncLocalStorage<string> };
const clock = (held.matchmarkClock ??= new AsyncLocalStorage<string>());

/** The time now, ISO 8601 in UTC. Use cases ask here, never `Date`. */
export const now = (): string => clock.getStore() ?? new Date().toISOString();

/** Runs `fn` as if it were `time` (ISO 8601 in UTC). */
export const atTime = <T>(time: string, fn: () => Promise<T>): Promise<T> => clock.run(time, fn);
