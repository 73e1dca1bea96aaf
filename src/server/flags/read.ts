import { readsFlag } from '@/domain/flags/flags';
import { may, type Actor } from '@/domain/people/may';
import { inReadableBooks, readableBooks } from '../book/readable';
import { app } from '../context';
import { now } from '../clock';
import { loadFlags, type FlagView } from './rows';
import { shownFlags, type ShownFlag } from './shown';

export interface FlagLists {
  /** Open ones that I may answer, the oldest first: who asked first waits longest. */
  toAnswer: ShownFlag[];
  /** All that I raised, newest first. */
  mine: ShownFlag[];
}

/** The flags that concern a person. */
export async function readFlags(actor: Actor): Promise<FlagLists> {
  const books = inReadableBooks(readableBooks(actor));
  const [open, mine] = await Promise.all([
    loadFlags(`f.state = 'open' AND f.personId <> :me AND ${books.where}`, {
      ...books.replacements,
      me: actor.personId,
    }),
    loadFlags('f.personId = :me', { me: actor.personId }),
  ]);
  return {
    toAnswer: await shownFlags(actor, open.filter(({ facts }) => may(actor, 'answerFlag', facts).ok).reverse()),
    mine: await shownFlags(
      actor,
      mine.filter(({ facts }) => readsFlag(actor, facts)),
    ),
  };
}

/** Flags of mine that ended and that I have not seen since; a page says so once. */
export async function endedUnseen(personId: string): Promise<number> {
  const { db } = await app();
  const [row] = await db.read<{ n: number }>(
    `SELECT count(*) AS n FROM flags WHERE personId = :personId AND state IN ('answered', 'taken up') AND seenAt IS NULL`,
    { personId },
  );
  return row?.n ?? 0;
}

/** Notes that a person has seen how these flags of theirs ended. */
export async function noteSeen(actor: Actor, flags: readonly FlagView[]): Promise<void> {
  const ids = flags.filter(({ seen, state }) => !seen && state !== 'open').map(({ id }) => id);
  if (ids.length === 0) return;
  const { db } = await app();
  await db.write(async () => {
    await db.models.Flag.update({ seenAt: now() }, { where: { id: ids, personId: actor.personId } });
  });
}
