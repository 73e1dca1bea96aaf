import type { Origin } from '@/domain/api/schemas/imports';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { may, type Actor, type Book } from '@/domain/people/may';
import { refuseOverlong } from '../book/check';
import { app } from '../context';
import { forbidden, notFound } from '../refusal';
import { refuseUnreadable, weigh } from './draftText';
import { makeDraft } from './makeDraft';
import { keepOrigin, sheetToCopy } from './origin';
import { readProposal } from './readProposal';

export interface NewProcedure {
  /** "common" or the id of a shop. */
  book: string;
  source: string;
  reason: string;
  /** What it was begun from, where that is kept. */
  origin?: Origin | undefined;
}

/** Numbers up to here are for procedures that a release ships, so that a later release never finds one taken. */
const RELEASED_UP_TO = 1000;

/** The number after the highest of the network, whoever may see that one. */
async function nextNumber(): Promise<string> {
  const { db } = await app();
  const [row] = await db.read<{ highest: number | null }>(
    'SELECT max(CAST(substr(number, 3) AS INTEGER)) AS highest FROM procedures',
  );
  return `P-${String(Math.max(row?.highest ?? 0, RELEASED_UP_TO) + 1).padStart(4, '0')}`;
}

/** The book of that name, if this person may propose a new procedure for it: 404 an unknown one, 403 without the role. */
export function bookToWriteFor(actor: Actor, name: string): Book {
  const book: Book = name === 'common' ? { kind: 'common' } : { kind: 'shop', shopId: name };
  const permission = may(actor, 'propose', { book });
  if (!permission.ok) throw permission.visible ? forbidden(permission.why) : notFound();
  return book;
}

/**
 * Starts a draft of a new procedure under the next free number, unseen by others until it is sent in.
 * Refuses 404 a book that is unknown or not theirs, 403 without a role that proposes, 422 a text that
 * cannot be read (nothing is stored); of a copy also as `sheetToCopy` does.
 */
export async function startProcedure(
  actor: Actor,
  { book: name, source, reason, origin }: NewProcedure,
): Promise<Proposal> {
  const book = bookToWriteFor(actor, name);
  if (origin?.kind === 'copy') await sheetToCopy(actor, book, origin.number, origin.letter);
  refuseOverlong(source);
  const text = await weigh(source, null);
  refuseUnreadable(text.parsed);
  const { db } = await app();
  const shopId = book.kind === 'shop' ? book.shopId : null;
  const id = await db.write(async () => {
    const number = await nextNumber();
    const procedure = await db.models.Procedure.create({ number, bookKind: book.kind, shopId });
    if (origin) await keepOrigin(procedure.id, origin);
    return makeDraft(actor, { procedureId: procedure.id, number, shopId, on: null, text, reason });
  });
  return readProposal(actor, id);
}
