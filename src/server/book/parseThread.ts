import { Worker } from 'node:worker_threads';

/** What a parse thread says once it can take a text. */
export const READY = 'ready';

/** Enough for the largest text in bounds; a text that wants more ends its thread, not the server. */
const LIMITS = { maxOldGenerationSizeMb: 256, maxYoungGenerationSizeMb: 64, stackSizeMb: 4 };

/** Starts the thread. From source its program is TypeScript, which the thread must first learn to read. */
export function startThread(url: URL): Worker {
  if (!url.pathname.endsWith('.ts')) return new Worker(url, { resourceLimits: LIMITS });
  const program = `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(url.href)}); })`;
  return new Worker(program, { eval: true, resourceLimits: LIMITS });
}
