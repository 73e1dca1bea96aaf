import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { may, type Actor } from '@/domain/people/may';
import { subjectOf } from '@/domain/review/rules';
import { loadProposals } from './proposals';
import { summaryOf } from './view';

/** All that a person has proposed and may still see: what waits for them first, then what waits for others, then what is done. */
export async function listMine(actor: Actor): Promise<ProposalSummary[]> {
  const mine = await loadProposals(
    `r.authorId = :me ORDER BY
       CASE r.state WHEN 'returned' THEN 0 WHEN 'draft' THEN 1 WHEN 'proposed' THEN 2 ELSE 3 END, r.updatedAt DESC, r.id`,
    { me: actor.personId },
  );
  return mine.filter(({ facts }) => may(actor, 'readProposal', subjectOf(facts)).ok).map(summaryOf);
}
