import type { RenderedProcedure } from '@/domain/procedure/types';
import { failingWords } from '@/domain/review/overrides';
import { releaseStep } from '@/domain/revision/release';
import { app } from '../context';
import { settleText, type Weighed } from '../review/draftText';
import { Refusal } from '../refusal';
import { readContent, type ContentFile } from './contentFiles';
import { addFromRelease, proposeFromRelease, reviseFromRelease, standingOf, type Standing } from './release';

/** Numbers of the procedures that each thing was done with. */
export interface Imported {
  added: string[];
  revised: string[];
  proposed: string[];
  /** Files that were left out, and why. */
  problems: { file: string; message: string }[];
}

/** What the book remembers of a file, as JSON under the setting `content.P-0142`. */
interface Remembered {
  /** SHA-256 of the file: while it is the same, the file is not even parsed. */
  file: string;
  /** SHA-256 of the canonical text that it held. */
  shipped: string;
}

const KEY = 'content.';

/**
 * Files taken in one transaction. A book of thousands held whole until one transaction at the end takes
 * gigabytes; a start that is cut off keeps the batches it finished and goes on from there.
 */
const BATCH = 100;

interface Shipped extends ContentFile {
  standing: Standing | null;
  text: Weighed;
  rendered: RenderedProcedure;
}

/**
 * Brings the procedures of `CONTENT_DIR` into the common book: a new file becomes published revision A; a
 * file that a later release changed becomes the next revision or, where the book has its own changes, a
 * proposal. Done twice, it does nothing the second time. A file that cannot be read is left out and told.
 */
export async function importContent(): Promise<Imported> {
  const { config, db } = await app();
  const known = await remembered();
  const imported: Imported = { added: [], revised: [], proposed: [], problems: [] };
  const changed = (await readContent(config.contentDir)).filter(({ number, hash }) => known.get(number)?.file !== hash);

  for (let from = 0; from < changed.length; from += BATCH) {
    const shipped: Shipped[] = [];
    // Read before the transaction, so that nobody waits for the parser.
    for (const file of changed.slice(from, from + BATCH)) {
      try {
        shipped.push(await readShipped(file));
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
        imported.problems.push({ file: file.name, message: error.detail });
      }
    }
    if (shipped.length > 0)
      await db.write(async () => {
        for (const file of shipped) await take(file, known.get(file.number)?.shipped ?? null, imported);
      });
  }
  return imported;
}

async function readShipped(file: ContentFile): Promise<Shipped> {
  const standing = await standingOf(file.number);
  if (standing && standing.bookKind !== 'common')
    throw new Refusal(409, 'number', 'Number taken', `${file.number} is taken by a shop's own procedure.`);
  if (standing && !standing.current)
    throw new Refusal(409, 'number', 'Number taken', `${file.number} is taken by a procedure that is being written.`);
  const { text, rendered } = await settleText(file.source, standing?.current?.id ?? null);
  return { ...file, standing, text, rendered };
}

async function take(
  { name, number, hash, standing, text, rendered }: Shipped,
  before: string | null,
  imported: Imported,
) {
  const { db } = await app();
  const current = standing?.current ?? null;
  // On a withdrawn sheet a later text waits for review too.
  const fails = text.failingTorques.length > 0;
  const step = releaseStep({ shipped: text.hash, before, current: current?.hash ?? null, fails });
  if (step === 'refuse') {
    // Not remembered, so that it is told at each start until the file is mended.
    imported.problems.push({ file: name, message: refusedWords(text.failingTorques) });
    return;
  }
  if (step === 'add') {
    await addFromRelease(number, text, rendered);
    imported.added.push(number);
  } else if (standing && current && step === 'revise' && !standing.withdrawn) {
    await reviseFromRelease({ ...standing, current }, text, rendered);
    imported.revised.push(number);
  } else if (standing && current && step !== 'none') {
    await proposeFromRelease({ ...standing, current }, text, rendered);
    imported.proposed.push(number);
  }
  const value: Remembered = { file: hash, shipped: text.hash };
  await db.models.Setting.upsert({ key: KEY + number, value: JSON.stringify(value) });
}

const refusedWords = (failing: Weighed['failingTorques']) =>
  `It would clamp ${failingWords(failing)}. What a release adds nobody reviews, so nobody could override the clamp check.`;

async function remembered(): Promise<Map<string, Remembered>> {
  const { db } = await app();
  const rows = await db.read<{ key: string; value: string }>('SELECT key, value FROM settings WHERE key LIKE :like', {
    like: `${KEY}%`,
  });
  return new Map(rows.map(({ key, value }) => [key.slice(KEY.length), JSON.parse(value) as Remembered]));
}
