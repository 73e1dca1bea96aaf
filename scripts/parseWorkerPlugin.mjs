/**
 * Vite plugin: emits src/server/book/parseWorker.ts as a file of its own in the server build and lets
 * parseWorkerUrl.ts name that file. Vite bundles workers for the browser only; on the server the
 * address of a source file would be left in the build, where no such file exists.
 */
export function parseWorker() {
  /** @type {string | undefined} */
  let reference;
  return {
    name: 'matchmark-parse-worker',
    apply: 'build',
    async load(id) {
      if (!id.split('?')[0].endsWith('/src/server/book/parseWorkerUrl.ts')) return null;
      reference ??= this.emitFile({
        type: 'chunk',
        id: id.split('?')[0].replace(/parseWorkerUrl\.ts$/, 'parseWorker.ts'),
        name: 'parse-worker',
      });
      return `export const parseWorkerUrl = new URL(import.meta.ROLLUP_FILE_URL_${reference});`;
    },
  };
}
