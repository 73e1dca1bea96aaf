import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { nextLetter } from '@/domain/revision/letters';
import { Refusal } from '../refusal';
import { compareProposal, type ComparedProposal } from './compareProposal';
import { readProposal } from './readProposal';

export interface ReviewPage {
  proposal: Proposal;
  /** Null while the author's draft cannot be read; `fault` then says where it stops. */
  compared: ComparedProposal | null;
  fault: string | null;
  /**
   * The letter that it has, or would get if it were published next; null where it stands on an older revision, and
   * where it was declined, for then it never gets one.
   */
  letter: string | null;
}

/** A proposal with what it changes. Refuses 404 like `readProposal`. */
export async function readReview(actor: Actor, id: string): Promise<ReviewPage> {
  const proposal = await readProposal(actor, id);
  const { publishedLetter, base, currentLetter, state } = proposal;
  const next = base === currentLetter && state !== 'declined' ? nextLetter(currentLetter) : null;
  const letter = publishedLetter ?? next;
  try {
    return { proposal, compared: await compareProposal(actor, id), fault: null, letter };
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 422) throw error;
    const [first] = error.errors ?? [];
    const where = first?.line === undefined ? '' : `Line ${first.line}: `;
    return { proposal, compared: null, fault: `${where}${first?.message ?? error.detail}`, letter };
  }
}
