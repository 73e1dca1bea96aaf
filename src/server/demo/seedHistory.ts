import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { toSource } from '@/domain/procedure/canonical';
import { whoIs } from '../accounts/whoIs';
import { acceptedProcedure } from '../book/compare';
import { readSheet } from '../book/sheet';
import { withdraw } from '../bulletins/withdraw';
import { atTime } from '../clock';
import { app } from '../context';
import { agree } from '../review/agree';
import { returnToAuthor } from '../review/giveBack';
import { publish } from '../review/publish';
import { startProcedure } from '../review/startProcedure';
import { startProposal } from '../review/startProposal';
import { submit } from '../review/submit';
import { startThread } from '../review/threads/start';
import { addEvidence } from '../photos/evidence';
import { uploadDrawing } from './drawings';
import { CHAPTERS, type Change, type Chapter, type NewSheet } from './chapters';

const DONE = 'demonstration.history';
const DAY = 86_400_000;

/** A moment of the working day, `days` before now; `step` sets acts of one day apart. ISO 8601 in UTC. */
export function daysAgo(days: number, step = 0): string {
  const day = new Date(Date.now() - days * DAY);
  day.setUTCHours(8 + step, (days * 17) % 60, 0, 0);
  return day.toISOString();
}

/** The day the demonstration's common book was first issued. */
export const FIRST_ISSUE = 86;

async function person(email: string): Promise<Actor> {
  const { db } = await app();
  const [found] = await db.read<{ personId: string; tokenVersion: number }>(
    'SELECT id AS personId, tokenVersion FROM people WHERE email = :email AND demonstration = 1',
    { email },
  );
  const who = found && (await whoIs(found));
  if (!who) throw new Error(`The demonstration has no ${email}.`);
  return who.actor;
}

/**
 * Acts out what happened in the demonstration network before today, through the same use cases as a
 * person, at its own dates. Once only, and never in a book that people have written in.
 */
export async function seedHistory(): Promise<void> {
  const { db } = await app();
  const [state] = await db.read<{ done: number; written: number }>(
    `SELECT EXISTS (SELECT 1 FROM settings WHERE key = :key) AS done,
       EXISTS (SELECT 1 FROM revisions r JOIN people p ON p.id = r.authorId WHERE p.kind = 'person') AS written`,
    { key: DONE },
  );
  if (state?.done || state?.written) return;
  await db.write(async () => {
    for (const chapter of CHAPTERS) await actOut(chapter);
    await db.models.Setting.create({ key: DONE, value: new Date().toISOString() });
  });
}

async function actOut(chapter: Chapter): Promise<void> {
  if ('withdrawn' in chapter) {
    const { number, by, reason } = chapter;
    await atTime(daysAgo(chapter.withdrawn), async () => withdraw(await person(by), number, reason));
    return;
  }
  const author = await person(chapter.author);
  const draft = await atTime(daysAgo(chapter.sentIn), () => start(chapter, author));
  const { shows } = chapter;
  if (shows)
    await atTime(daysAgo(chapter.sentIn), async () =>
      addEvidence(author, draft.id, [(await uploadDrawing(author, shows)).id]),
    );
  const { id } = await atTime(daysAgo(chapter.sentIn, 1), () => submit(author, draft.id));
  const { end } = chapter;
  const agreed = 'returned' in end ? [] : (end.agreed ?? []);
  const day = 'published' in end ? end.published : 'returned' in end ? end.returned : chapter.sentIn - 1;
  for (const email of agreed) await atTime(daysAgo(day, 2), async () => agree(await person(email), id));
  const { asked } = chapter;
  if (asked)
    await atTime(daysAgo(day, 4), async () => {
      const asker = await person(asked.by);
      await startThread(asker, id, {
        kind: 'question',
        anchor: asked.anchor,
        text: asked.question,
        photos: asked.shows ? [(await uploadDrawing(asker, asked.shows)).id] : [],
      });
    });
  if ('published' in end) await atTime(daysAgo(day, 3), async () => publish(await person(end.by), id));
  if ('returned' in end)
    await atTime(daysAgo(day, 3), async () =>
      returnToAuthor(await person(end.by), id, { reason: end.reason, anchor: end.anchor }),
    );
}

async function start(chapter: Change | NewSheet, author: Actor): Promise<Proposal> {
  const { reason } = chapter;
  if ('file' in chapter) {
    const { config } = await app();
    const source = await readFile(join(config.contentDir, 'demonstration', chapter.file), 'utf8');
    const shop = author.memberships.find((m) => m.in === 'shop');
    if (!shop) throw new Error(`${chapter.author} works in no shop.`);
    return startProcedure(author, { book: shop.shopId, source, reason });
  }
  const { number, change } = chapter;
  const sheet = await readSheet(author, number);
  const procedure = await acceptedProcedure(sheet.source);
  // Parsed texts are shared by their hash: the change is made to a copy.
  const changed = structuredClone(procedure);
  change(changed);
  return startProposal(author, number, { base: sheet.revision.letter, source: toSource(changed), reason });
}
