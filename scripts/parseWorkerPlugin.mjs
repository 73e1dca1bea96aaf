/**
 * Vite plugin: emits the program of each thread as a file of its own in the server build and lets its `…Url.ts` name
 * that file. Vite bundles workers for the browser only; on the server the address of a source file would be left in
 * the build, where no such file exists.
 */
const THREADS = [
  { url: /\/src\/server\/book\/parseWorkerUrl\.ts$/, constant: 'parseWorkerUrl', name: 'parse-worker' },
  { url: /\/src\/server\/imports\/importWorkerUrl\.ts$/, constant: 'importWorkerUrl', name: 'import-worker' },
];

export function parseWorker() {
  /** @type {Map<string, string>} */
  const references = new Map();
  return {
    name: 'matchmark-parse-worker',
    apply: 'build',
    async load(id) {
      const [file] = id.split('?');
      const thread = THREADS.find(({ url }) => url.test(file));
      if (!thread) return null;
      const { name, constant } = thread;
      const reference =
        references.get(name) ?? this.emitFile({ type: 'chunk', id: file.replace(/Url\.ts$/, '.ts'), name });
      references.set(name, reference);
      return `export const ${constant} = new URL(import.meta.ROLLUP_FILE_URL_${reference});`;
    },
  };
}
