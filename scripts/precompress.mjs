import { readdir, readFile, writeFile } from 'node:fs/promises';
import { extname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { brotliCompressSync, constants, gzipSync } from 'node:zlib';

/** Writes a .br and a .gz beside every text asset of the build, so that serving one costs no time. */
const root = fileURLToPath(new URL('../dist/client', import.meta.url));
const TEXT = new Set(['.js', '.css', '.svg', '.json', '.webmanifest', '.txt', '.html']);

for (const entry of await readdir(root, { recursive: true, withFileTypes: true })) {
  if (!entry.isFile() || !TEXT.has(extname(entry.name))) continue;
  const file = join(entry.parentPath ?? entry.path, entry.name);
  const bytes = await readFile(file);
  if (bytes.length < 1024) continue;
  await writeFile(`${file}.br`, brotliCompressSync(bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 11 } }));
  await writeFile(`${file}.gz`, gzipSync(bytes, { level: 9 }));
}
