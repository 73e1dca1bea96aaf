/** Where the import thread's program lies; in a build scripts/parseWorkerPlugin.mjs puts the emitted file here. */
export const importWorkerUrl = new URL('./importWorker.ts', import.meta.url);
