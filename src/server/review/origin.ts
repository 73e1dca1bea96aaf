import type { Origin } from '@/domain/api/schemas/imports';
import { may, type Actor, type Book } from '@/domain/people/may';
import { bookFromRef } from '@/domain/people/bookFromRef';
import { subjectOf } from '@/domain/review/rules';
import { bookOf, type BookRow } from '../book/columns';
import { readSheet } from '../book/sheet';
import { app } from '../context';
import { conflict, forbidden, notFound } from '../refusal';
import type { Loaded } from './proposals';

/**
 * What a new procedure was begun from; null for a change to one, and for one that was written from nothing. A sheet that
 * was copied is named to who may read it; what a document held is for the author and for who judges the text.
 */
export async function originOf(
  actor: Actor,
  { procedureId, parentId, authorId, facts }: Pick<Loaded, 'procedureId' | 'parentId' | 'authorId' | 'facts'>,
): Promise<Origin | null> {
  if (parentId !== null) return null;
  const { db } = await app();
  const [row] = await db.read<{ json: string }>('SELECT json FROM origins WHERE procedureId = :procedureId', {
    procedureId,
  });
  if (!row) return null;
  const origin = JSON.parse(row.json) as Origin;
  if (actor.personId === authorId) return origin;
  if (origin.kind === 'import') return may(actor, 'agree', subjectOf(facts)).ok ? origin : null;
  const [from] = await db.read<Pick<BookRow, 'bookKind' | 'shopId'>>(
    'SELECT bookKind, shopId FROM procedures WHERE number = :number',
    { number: origin.number },
  );
  return from && may(actor, 'readBook', { book: bookOf(from) }).ok ? origin : null;
}

/** Keeps it with the procedure. Call it inside a `write`. */
export async function keepOrigin(procedureId: string, origin: Origin): Promise<void> {
  const { db } = await app();
  await db.models.ProcedureOrigin.create({ procedureId, json: origin });
}

/**
 * The sheet that a copy is made from. Refuses 404 one that is unknown or not theirs, 403 where its text may not go into
 * that book, 409 one that is withdrawn.
 */
export async function sheetToCopy(actor: Actor, to: Book, number: string, letter?: string) {
  const sheet = await readSheet(actor, number, letter);
  const permission = may(actor, 'copySheet', { from: bookFromRef(sheet.book), to });
  if (!permission.ok) throw permission.visible ? forbidden(permission.why) : notFound();
  if (sheet.withdrawn) throw conflict(`${number} is withdrawn. Copy a sheet that is in use.`);
  return sheet;
}
