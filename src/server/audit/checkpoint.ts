import { readFile, rename, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import type { Link } from '@/domain/audit/chain';
import type { Fault } from '@/domain/audit/fault';
import { now } from '../clock';
import { app } from '../context';

/**
 * How far the trail was when it was last found whole, kept in a file beside the database. A chain whose end was cut off is
 * a whole chain still; this is how the cut is known. It proves nothing against somebody who can write the file as well:
 * for that, keep the count and the hash that `npm run audit:check` prints elsewhere, and give them back with `--expect`.
 */
const Checkpoint = z.object({
  entries: z.number().int().nonnegative(),
  hash: z.string().regex(/^([0-9a-f]{64})?$/),
  at: z.string(),
});
export type Checkpoint = z.infer<typeof Checkpoint>;

const pathOf = async () => join((await app()).config.dataDir, 'audit-checkpoint.json');

/** Null where none was kept yet, or where the file holds none. */
export async function readCheckpoint(): Promise<Checkpoint | null> {
  try {
    return Checkpoint.parse(JSON.parse(await readFile(await pathOf(), 'utf8')));
  } catch {
    return null;
  }
}

/** Written whole under another name first, so that it is the old one or the new one at any moment. */
export async function keepCheckpoint({ seq, hash }: Link): Promise<void> {
  const path = await pathOf();
  const fresh = `${path}.${process.pid}.new`;
  const checkpoint: Checkpoint = { entries: seq, hash, at: now() };
  try {
    await writeFile(fresh, `${JSON.stringify(checkpoint)}\n`, { mode: 0o600 });
    await rename(fresh, path);
  } catch (error) {
    // The book can be read, and the trail checked, on a disk that cannot be written.
    console.warn('audit: the checkpoint could not be kept', error);
    await rm(fresh, { force: true }).catch(() => undefined);
  }
}

const trailFault = (differs: string, at: string | null = null): Fault => ({
  table: 'auditEntries',
  id: 'end',
  at,
  number: null,
  letter: null,
  differs: [differs],
});

/** The last number that the database gave to an entry; ask for it before the trail is followed, which goes on meanwhile. */
export async function numbersGiven(): Promise<number> {
  const { db } = await app();
  const [row] = await db.read<{ seq: number }>(`SELECT seq FROM sqlite_sequence WHERE name = 'auditEntries'`);
  return row?.seq ?? 0;
}

/** What shows that the end of the trail was cut off or written anew. `expected` is what was seen of it before. */
export async function tailFaults(
  end: Link,
  { given, expected }: { given: number; expected: Pick<Checkpoint, 'entries' | 'hash'> | null },
): Promise<Fault[]> {
  const { db } = await app();
  const faults: Fault[] = [];
  if (given > end.seq)
    faults.push(trailFault(`ends at entry ${end.seq}, but numbers up to ${given} were given: its end was cut off`));
  if (!expected || expected.entries === 0) return faults;
  const { entries, hash } = expected;
  if (entries > end.seq)
    return [
      ...faults,
      trailFault(`ends at entry ${end.seq}, but it was seen with ${entries} entries: its end was cut off`),
    ];
  const [row] = await db.read<{ hash: string; at: string }>('SELECT hash, at FROM auditEntries WHERE seq = :entries', {
    entries,
  });
  // A hash may be given by its first digits, as somebody writes it down.
  if (row && !row.hash.startsWith(hash))
    faults.push(trailFault(`has another entry ${entries} than the one that was seen: it was written anew up to there`));
  return faults;
}
