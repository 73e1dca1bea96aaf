import type { Proposal } from '@/domain/api/schemas/proposals';
import { bookFromRef } from '@/domain/people/bookFromRef';
import { may, type Actor } from '@/domain/people/may';
import { restoreReason } from '@/domain/review/restore';
import { readSheet, readSheetKey } from '../book/sheet';
import { conflict, forbidden } from '../refusal';
import { startProposal } from './startProposal';

/**
 * Starts a draft on the current revision with the text of another one as it stands, also while the procedure is withdrawn.
 * Pressed twice it is one draft. What of later changes the text takes back, the review tells. Refuses 404, 403, 409 where
 * the two texts are the same, 422 a text that today's rules no longer accept.
 *
 * @param rest the reason behind "Brings back revision B: "; may be written later, before the draft is sent in
 */
export async function restoreRevision(actor: Actor, number: string, letter: string, rest = ''): Promise<Proposal> {
  const { book, revision, current, source } = await readSheet(actor, number, letter);
  const permission = may(actor, 'propose', { book: bookFromRef(book) });
  if (!permission.ok) throw forbidden(permission.why);
  if (letter === current.letter)
    throw conflict(`Revision ${letter} is the current one, so there is nothing to bring back. Propose a change to it.`);
  const { hash } = await readSheetKey(actor, number);
  if (hash === revision.hash)
    throw conflict(
      `Revision ${letter} says the same as revision ${current.letter}, so there is nothing to bring back.`,
    );
  return startProposal(actor, number, { base: current.letter, source, reason: restoreReason(letter, rest) });
}
