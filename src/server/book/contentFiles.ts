import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { hashOf } from './parsed';

/** `p-0142-valve-cover-reseal.mdx` is the text of P-0142. */
const FILE_NAME = /^p-(\d{4,6})-[a-z0-9]+(?:-[a-z0-9]+)*\.mdx$/;

export interface ContentFile {
  name: string;
  number: string;
  source: string;
  /** SHA-256 of the file as it is, hex. */
  hash: string;
}

export const proceduresDir = (contentDir: string) => join(contentDir, 'procedures');

/** Names of the procedure files by number, in the order of the numbers; an empty list where there is no folder. */
export async function procedureFiles(contentDir: string): Promise<Map<string, string>> {
  const names = await readdir(proceduresDir(contentDir)).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return [];
    throw error;
  });
  const files = new Map<string, string>();
  for (const name of names.sort()) {
    const number = FILE_NAME.exec(name)?.[1];
    if (!number) continue;
    const twin = files.get(`P-${number}`);
    if (twin) throw new Error(`${twin} and ${name} are both P-${number}. Give one of them another number.`);
    files.set(`P-${number}`, name);
  }
  return files;
}

export async function readContent(contentDir: string): Promise<ContentFile[]> {
  const files = await procedureFiles(contentDir);
  return Promise.all(
    [...files].map(async ([number, name]) => {
      const source = await readFile(join(proceduresDir(contentDir), name), 'utf8');
      return { name, number, source, hash: hashOf(source) };
    }),
  );
}
