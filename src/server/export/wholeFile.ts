import { rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

/** Writes a file beside its place and renames it there, so that it is never left half written. */
export async function writeWhole(folder: string, name: string, content: string | Buffer): Promise<void> {
  const part = join(folder, `.${name}.part`);
  await writeFile(part, content);
  await rename(part, join(folder, name));
}
