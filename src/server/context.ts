import { AsyncLocalStorage } from 'node:async_hooks';
import type { Database } from '@db/database';
import type { Config } from './config';

/** What the use cases stand on. */
export interface App {
  config: Config;
  db: Database;
  /** Signs sessions. */
  secret: string;
}

// Kept on globalThis: a development server loads this module again after each change, but the database stays open.
const held = globalThis as { matchmarkApp?: Promise<App>; matchmarkStarting?: AsyncLocalStorage<App> };
const starting = (held.matchmarkStarting ??= new AsyncLocalStorage<App>());

/** The one running application. `startOnce` (start.ts) opens it; every request goes through the middleware, which does. */
export function app(): Promise<App> {
  const inside = starting.getStore();
  if (inside) return Promise.resolve(inside);
  if (!held.matchmarkApp) throw new Error('The book is not open yet: call startOnce() first.');
  return held.matchmarkApp;
}

/** Opens it with `open` unless that was done; a failed opening is tried again by the next caller. */
export function openOnce(open: () => Promise<App>): Promise<App> {
  held.matchmarkApp ??= open().catch((error: unknown) => {
    delete held.matchmarkApp;
    throw error;
  });
  return held.matchmarkApp;
}

/** Makes `app()` answer with this one; for tests and for scripts that open a book themselves. */
export function useApp(running: App | undefined): void {
  if (running) held.matchmarkApp = Promise.resolve(running);
  else delete held.matchmarkApp;
}

/** Runs `fn` with `running` as its `app()`, while everybody else still waits for the start to end. */
export const within = <T>(running: App, fn: () => Promise<T>): Promise<T> => starting.run(running, fn);
