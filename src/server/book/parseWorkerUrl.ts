/**
 * Where the parse thread's program lies. From source it is the file beside this one; in a build the
 * Vite plugin of scripts/parseWorkerPlugin.mjs puts the address of the emitted file here instead.
 */
export const parseWorkerUrl = new URL('./parseWorker.ts', import.meta.url);
