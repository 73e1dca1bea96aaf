import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { now } from '../clock';
import { app } from '../context';
import { guard, readableProposal } from './guard';
import { readProposal } from './readProposal';
import { record } from './record';
import { keepVersion } from './versions/keep';

/** Why, and where: `step:<id>`, the path of a value, or null for the whole. */
export interface GivenReason {
  reason: string;
  anchor: string | null;
}

const DONE = { return: 'returned', decline: 'declined' } as const;

/** Ends a review without publishing: the written reason and the new state are stored together. */
async function giveBack(
  act: keyof typeof DONE,
  actor: Actor,
  id: string,
  { reason, anchor }: GivenReason,
  version: number | null,
): Promise<Proposal> {
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    const { state } = guard({ act, reason }, actor, proposal, version);
    const kind = DONE[act];
    await db.models.Remark.create({
      revisionId: id,
      personId: actor.personId,
      kind,
      text: reason.trim(),
      anchor,
      at: now(),
    });
    await db.models.Revision.update({ state, version: proposal.version + 1 }, { where: { id } });
    if (act === 'return') {
      const { source, reason: why, parentId } = proposal;
      const { personId } = actor;
      await keepVersion(proposal, { revisionId: id, kind: 'return', personId, source, reason: why, parentId });
    }
    await record(actor, `proposal.${kind}`, proposal, { hash: proposal.hash, reason: reason.trim(), anchor });
  });
  return readProposal(actor, id);
}

/** Sends a proposal back to its author, who improves it and sends it in again. */
export const returnToAuthor = (actor: Actor, id: string, why: GivenReason, version: number | null = null) =>
  giveBack('return', actor, id, why, version);

/** Declines a proposal for good. */
export const decline = (actor: Actor, id: string, why: GivenReason, version: number | null = null) =>
  giveBack('decline', actor, id, why, version);
