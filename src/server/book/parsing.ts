import type { Parsed } from '@/domain/procedure/types';
import { ParseQueue } from './parseQueue';
import { parseWorkerUrl } from './parseWorkerUrl';

/** Every text in bounds takes less than a tenth of this; the rest is for what nobody has thought of. */
const LIMIT = 1500;
const PATIENCE = 12_000;

// Kept on globalThis: a development server loads this module again after each change, but one thread is enough.
const held = globalThis as { matchmarkParser?: ParseQueue<string, Parsed> };

const refused = (message: string): Parsed => ({ ok: false, errors: [{ line: 1, column: 1, message }] });

const parser = () =>
  (held.matchmarkParser ??= new ParseQueue<string, Parsed>({
    url: parseWorkerUrl,
    limit: LIMIT,
    patience: PATIENCE,
    startLimit: 20_000,
    places: 40,
    tooLong: refused(
      'This text takes too long to read. Look for very long tables, deep lists or brackets without end, and write it plainer.',
    ),
    broke: refused('This text could not be read. Write it plainer, or divide it into two procedures.'),
  }));

/**
 * Parses foreign text in a thread with a limit of time, so that no text can hold up the server. Never evaluates.
 * Errors come with line and column; a text that takes too long is refused in a sentence. Rejects with a
 * 503 refusal when too many texts wait.
 */
export function parseSafely(source: string): Promise<Parsed> {
  return parser().parse(source);
}

/** Starts the thread, so that the first text does not wait for it; call it when the server starts. */
export function startParsing(): void {
  parser().start();
}

/** Ends the thread, where it was started; a later text starts it again. */
export async function stopParsing(): Promise<void> {
  await held.matchmarkParser?.close();
  delete held.matchmarkParser;
}
