import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { may, type Actor } from '@/domain/people/may';
import { subjectOf } from '@/domain/review/rules';
import type { RevisionState } from '@/domain/revision/types';
import { loadProposals } from './proposals';
import { summaryOf } from './view';

/**
 * All that a person has proposed and may still see: what waits for them first, then what waits for others, then what is
 * done; or of it what is in one state.
 */
export async function listMine(actor: Actor, state: RevisionState | null = null): Promise<ProposalSummary[]> {
  const mine = await loadProposals(
    `r.authorId = :me ${state ? 'AND r.state = :state' : ''} ORDER BY
       CASE r.state WHEN 'returned' THEN 0 WHEN 'draft' THEN 1 WHEN 'proposed' THEN 2 ELSE 3 END, r.updatedAt DESC, r.id`,
    { me: actor.personId, state },
  );
  return mine.filter(({ facts }) => may(actor, 'readProposal', subjectOf(facts)).ok).map(summaryOf);
}
