import { copyFile, mkdir } from 'node:fs/promises';
import { join, resolve } from 'node:path';
import type { Sheet } from '@/domain/api/schemas/book';
import { ditaTask } from '@/domain/export/dita/task';
import type { Places } from '@/domain/export/dita/prose';
import { fileName } from '@/domain/export/slug';
import type { Actor } from '@/domain/people/may';
import { readLetters } from '../book/history';
import { readSheet } from '../book/sheet';
import { readTrade } from '../book/trade';
import { app } from '../context';
import { CannotExport } from './git';
import { writeWhole } from './wholeFile';

const taskName = (number: string, title: string): string => fileName(number, title).replace(/\.mdx$/, '.dita');

async function taskOf(sheet: Sheet, firstPublished: string, places: Places): Promise<string> {
  const { engines } = await readTrade();
  const { number, revision, current, withdrawn, book, frontmatter } = sheet;
  return ditaTask(
    sheet,
    {
      number,
      letter: revision.letter,
      sheetCheck: revision.sheetCheck,
      standing: withdrawn ? 'withdrawn' : revision.letter === current.letter ? 'current' : 'superseded',
      firstPublished,
      published: revision.publishedAt,
      author: revision.author.name,
      reviewers: revision.reviewers.map(({ name }) => name),
      book: book.name,
      engines: frontmatter.engines.map((key) => engines.find((engine) => engine.key === key)?.name ?? key),
    },
    places,
  );
}

/**
 * The current sheet of a procedure as a DITA task, and what to call the file. Links and drawings lead to the book's own
 * address. Refuses 404 what is unknown or not readable.
 *
 * @param here the origin that the request came to
 */
export async function readTask(actor: Actor, number: string, here: string): Promise<{ name: string; text: string }> {
  const { config } = await app();
  const origin = config.origin ?? here;
  const sheet = await readSheet(actor, number);
  const letters = await readLetters(actor, number);
  const text = await taskOf(sheet, letters.at(-1)?.publishedAt ?? sheet.revision.publishedAt, {
    link: (url) => ({ href: new URL(url, origin).href, scope: 'external' }),
    figure: (file) => ({ href: `${origin}/figures/${file}`, scope: 'external' }),
  });
  return { name: taskName(sheet.number, sheet.title), text };
}

/** Reads every procedure of one book; for whoever runs the server, whose role nobody asks. */
const readerOf = (shopId: string | null): Actor => ({
  personId: '',
  memberships: [shopId === null ? { in: 'common', role: 'editor' } : { in: 'shop', shopId, role: 'apprentice' }],
});

/**
 * Writes each sheet in use of a book as a DITA task into a folder, with the drawings in `figures` beside them; links among
 * the sheets written lead from file to file, others to the book's address where one is set. Answers the names written.
 *
 * @param figuresDir where the drawings lie
 */
export async function writeTasks(
  folder: string,
  shopId: string | null,
  figuresDir = resolve('public/figures'),
): Promise<string[]> {
  const { db, config } = await app();
  const rows = await db.read<{ number: string; title: string; first: string }>(
    `SELECT p.number, json_extract(r.head, '$.title') AS title,
       (SELECT min(publishedAt) FROM revisions WHERE procedureId = p.id) AS first
     FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId
     WHERE p.shopId IS :shopId AND p.withdrawnAt IS NULL ORDER BY p.number`,
    { shopId },
  );
  if (rows.length === 0) throw new CannotExport('Nothing in this book is in use, so there is no sheet to export.');
  const names = new Map(rows.map(({ number, title }) => [number, taskName(number, title)]));
  const drawings = new Set<string>();
  const places: Places = {
    link: (url) => {
      const name = names.get(/^\/procedures\/(P-\d{4,6})$/.exec(url)?.[1] ?? '');
      if (name !== undefined) return { href: name, scope: 'local' };
      return { href: config.origin && url.startsWith('/') ? config.origin + url : url, scope: 'external' };
    },
    figure: (file) => {
      drawings.add(file);
      return { href: `figures/${file}`, scope: 'local' };
    },
  };
  await mkdir(join(folder, 'figures'), { recursive: true });
  for (const { number, first } of rows) {
    const text = await taskOf(await readSheet(readerOf(shopId), number), first, places);
    await writeWhole(folder, names.get(number) ?? '', text);
  }
  for (const file of drawings) await copyFile(join(figuresDir, file), join(folder, 'figures', file));
  return [...names.values()];
}
