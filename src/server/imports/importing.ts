import type { Imported } from '@/domain/writing/import/importHowTo';
import { ParseQueue } from '../book/parseQueue';
import type { ToImport } from './file';
import { importWorkerUrl } from './importWorkerUrl';

/** Milliseconds of work: a document of the largest size in bounds takes a third of it. */
const LIMIT = 5000;
const PATIENCE = 20_000;

// Kept on globalThis: a development server loads this module again after each change, but one thread is enough.
const held = globalThis as { matchmarkImporter?: ParseQueue<ToImport, Imported> };

const refused = (message: string): Imported => ({ ok: false, message });

const importer = () =>
  (held.matchmarkImporter ??= new ParseQueue<ToImport, Imported>({
    url: importWorkerUrl,
    limit: LIMIT,
    patience: PATIENCE,
    startLimit: 20_000,
    places: 8,
    tooLong: refused('This document takes too long to read. Divide it, or paste its text.'),
    broke: refused('This document could not be read: it is too large or damaged. Divide it, or paste its text.'),
  }));

/**
 * Makes a draft of a foreign document in a thread with a limit of time and memory. The thread starts with the first
 * document. Rejects with a 503 refusal when too many wait.
 */
export const importSafely = (given: ToImport): Promise<Imported> => importer().parse(given);

/** Ends the thread, where it was started; a later document starts it again. */
export async function stopImporting(): Promise<void> {
  await held.matchmarkImporter?.close();
  delete held.matchmarkImporter;
}
