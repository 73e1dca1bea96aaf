import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { readableProposal } from './guard';
import { proposalOf } from './view';

/** A proposal in full. Refuses 404 an unknown one, somebody else's draft, and one of a book that is not theirs. */
export const readProposal = async (actor: Actor, id: string): Promise<Proposal> =>
  proposalOf(actor, await readableProposal(actor, id));
