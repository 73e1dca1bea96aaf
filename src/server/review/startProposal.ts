import type { Proposal } from '@/domain/api/schemas/proposals';
import { may, type Actor } from '@/domain/people/may';
import { bookOf, type BookRow } from '../book/columns';
import { refuseOverlong } from '../book/check';
import { readable } from '../book/locate';
import { hashOf } from '../book/parsed';
import { app } from '../context';
import { forbidden, invalid } from '../refusal';
import { refuseUnreadable, weigh } from './draftText';
import { staleBase } from './guard';
import { makeDraft } from './makeDraft';
import { readProposal } from './readProposal';

export interface Change {
  /** Letter of the revision that the text was written on. */
  base: string;
  source: string;
  reason: string;
}

interface Standing extends Pick<BookRow, 'bookKind' | 'shopId'> {
  procedureId: string;
  currentId: string;
  current: string;
  baseId: string | null;
}

async function standingOf(actor: Actor, number: string, base: string): Promise<Standing> {
  const { db } = await app();
  const [found] = await db.read<Standing>(
    `SELECT p.id AS procedureId, p.bookKind, p.shopId, c.id AS currentId, c.letter AS current,
       (SELECT id FROM revisions WHERE procedureId = p.id AND letter = :base) AS baseId
     FROM procedures p JOIN revisions c ON c.id = p.currentRevisionId WHERE p.number = :number`,
    { number, base },
  );
  const row = readable(actor, found);
  const permission = may(actor, 'propose', { book: bookOf(row) });
  if (!permission.ok) throw forbidden(permission.why);
  if (row.baseId === null)
    throw invalid(`${number} has no revision ${base}.`, [{ path: 'base', message: `there is no revision ${base}` }]);
  if (row.baseId !== row.currentId) throw staleBase({ base, current: row.current });
  return row;
}

/**
 * Starts a draft of a change to a published procedure. The same text on the same base, pressed twice, is
 * one draft; another text is a draft of its own. Refuses 404, 403, 422 a text that cannot be read (nothing
 * is stored), 409 a base that is no longer current.
 */
export async function startProposal(actor: Actor, number: string, { base, source, reason }: Change): Promise<Proposal> {
  const { baseId } = await standingOf(actor, number, base);
  refuseOverlong(source);
  const text = await weigh(source, baseId);
  refuseUnreadable(text.parsed);
  const { db } = await app();
  const id = await db.write(async () => {
    const { procedureId, shopId, currentId } = await standingOf(actor, number, base);
    const same = { procedureId, parentId: currentId, authorId: actor.personId, state: 'draft', hash: hashOf(source) };
    const twin = await db.models.Revision.findOne({ where: { ...same, everProposed: false } });
    if (twin) return twin.id;
    return makeDraft(actor, { procedureId, number, shopId, on: { id: currentId, letter: base }, text, reason });
  });
  return readProposal(actor, id);
}
