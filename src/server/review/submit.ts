import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import type { ProposalFacts } from '@/domain/review/rules';
import { keepRendering } from '../book/rendering';
import { now } from '../clock';
import { app } from '../context';
import { columnsOf, settleText, type Weighed } from './draftText';
import { guard, readableProposal } from './guard';
import type { Loaded } from './proposals';
import { readProposal } from './readProposal';
import { record } from './record';
import { keepVersion } from './versions/keep';

/** The facts as they will be once the text is settled. */
const settled = ({ facts }: Loaded, text: Weighed): ProposalFacts => ({
  ...facts,
  hash: text.hash,
  identical: text.identical,
  criticalReasons: text.criticalReasons,
  failing: text.failingTorques,
});

/**
 * Sends a draft in for review, its text in canonical form. Refuses 422 a text that cannot be read, a
 * missing reason and a text that changes nothing; 409 a base that is no longer current.
 */
export async function submit(actor: Actor, id: string, version: number | null = null): Promise<Proposal> {
  const before = await readableProposal(actor, id);
  // What can be known without the text is said first: who, in which state, on which base, why.
  guard({ act: 'submit' }, actor, before, version, { ...before.facts, identical: false });
  const { text, rendered } = await settleText(before.source, before.parentId);
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    const { state } = guard({ act: 'submit' }, actor, proposal, version ?? before.version, settled(proposal, text));
    await db.models.Revision.update(
      { ...columnsOf(text), state, everProposed: true, proposedAt: now(), version: proposal.version + 1 },
      { where: { id } },
    );
    const { reason, parentId } = proposal;
    const { personId } = actor;
    await keepVersion(proposal, { revisionId: id, kind: 'submit', personId, source: text.source, reason, parentId });
    await keepRendering(text.hash, rendered);
    await record(actor, 'proposal.submitted', proposal, {
      base: proposal.base,
      hash: text.hash,
      critical: text.critical,
    });
  });
  return readProposal(actor, id);
}
