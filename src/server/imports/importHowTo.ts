import { readFile } from 'node:fs/promises';
import type { ImportedSheet } from '@/domain/api/schemas/imports';
import { may, type Actor } from '@/domain/people/may';
import { readUpload, type Upload } from '../http/upload';
import { forbidden, invalid } from '../refusal';
import { bookToWriteFor } from '../review/startProcedure';
import type { ToImport } from './file';
import { importSafely } from './importing';

export const MOST_FILE = 5 * 1024 * 1024;

async function read(given: ToImport, field: 'markdown' | 'file'): Promise<ImportedSheet> {
  const imported = await importSafely(given);
  if (imported.ok) return imported.imported;
  const { message, line } = imported;
  throw invalid(line === undefined ? message : `Line ${line}: ${message}`, [
    { path: field, message, ...(line === undefined ? {} : { line, column: 1 }) },
  ]);
}

/** Refuses 403 whoever writes for no book at all, before anything that they send is read. */
export function refuseWhoNeverWrites(actor: Actor): void {
  const shops = actor.memberships.flatMap((m) =>
    m.in === 'shop' ? [{ kind: 'shop' as const, shopId: m.shopId }] : [],
  );
  const writes = [{ kind: 'common' as const }, ...shops].some((book) => may(actor, 'propose', { book }).ok);
  if (!writes) throw forbidden('A technician, senior technician, editor or owner writes procedures.');
}

/** A how-to in Markdown as a draft for that book; nothing is stored. Refuses as `bookToWriteFor`, 422 what cannot be read. */
export async function importText(actor: Actor, book: string, markdown: string): Promise<ImportedSheet> {
  bookToWriteFor(actor, book);
  return read({ markdown }, 'markdown');
}

/** The file of a form that was read already. */
export async function importUpload(actor: Actor, book: string, { file }: Upload): Promise<ImportedSheet> {
  bookToWriteFor(actor, book);
  if (!file) throw invalid('Choose a file.', [{ path: 'file', message: 'Choose a file.' }]);
  return read({ bytes: new Uint8Array(await readFile(file.path)) }, 'file');
}

/** A form with a file as a draft. Refuses 413 a file over 5 MB, else as `importText`. */
export async function importSent(actor: Actor, request: Request): Promise<{ imported: ImportedSheet; name: string }> {
  refuseWhoNeverWrites(actor);
  const upload = await readUpload(request, 'file', MOST_FILE);
  try {
    const imported = await importUpload(actor, upload.fields['book'] ?? '', upload);
    return { imported, name: upload.file?.name ?? '' };
  } finally {
    await upload.discard();
  }
}
