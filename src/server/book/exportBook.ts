import { mkdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { app } from '../context';
import { fileName } from '@/domain/export/slug';
import { writeWhole } from '../export/wholeFile';
import { procedureFiles, proceduresDir } from './contentFiles';

export interface Exported {
  written: string[];
  unchanged: string[];
}

/**
 * Writes every published procedure of the common book to `contentDir` as it is stored, byte for byte. A
 * file keeps its name; a procedure without one gets a name made of its title. Shop books stay where they are.
 */
export async function exportBook(contentDir: string): Promise<Exported> {
  const { db } = await app();
  const rows = await db.read<{ number: string; title: string; source: string }>(
    `SELECT p.number, json_extract(r.head, '$.title') AS title, r.source
     FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId
     WHERE p.bookKind = 'common' AND p.withdrawnAt IS NULL ORDER BY p.number`,
  );
  const folder = proceduresDir(contentDir);
  await mkdir(folder, { recursive: true });
  const names = await procedureFiles(contentDir);
  const exported: Exported = { written: [], unchanged: [] };
  for (const { number, title, source } of rows) {
    const name = names.get(number) ?? fileName(number, title);
    const bytes = Buffer.from(source, 'utf8');
    const there = await readFile(join(folder, name)).catch(() => null);
    if (there?.equals(bytes)) {
      exported.unchanged.push(name);
      continue;
    }
    await writeWhole(folder, name, bytes);
    exported.written.push(name);
  }
  return exported;
}
