import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { now } from '../clock';
import { app } from '../context';
import { guard, readableProposal } from './guard';
import { readProposal } from './readProposal';
import { record } from './record';

/** Which torque, by its key, and why it is right although its clamp check fails. */
export interface GivenReason {
  torque: string;
  reason: string;
}

/**
 * Overrides the failed clamp check of one torque of the text as it stands; the reason stays in the history of the sheet.
 * When the text changes it no longer counts. Refuses as `guard` does: 422 a torque that does not fail and a missing
 * reason, 409 one that is overridden already.
 */
export async function overrideClamp(
  actor: Actor,
  id: string,
  { torque, reason }: GivenReason,
  version: number | null = null,
): Promise<Proposal> {
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    const { overridden } = guard({ act: 'override', torque, reason }, actor, proposal, version);
    const failing = proposal.facts.failing.find(({ key }) => key === torque);
    if (!overridden || !failing) return;
    const { name, share } = failing;
    const { hash, personId } = overridden;
    const row = { revisionId: id, hash, personId, torqueKey: torque, reason: overridden.reason, share, at: now() };
    await db.models.ClampOverride.create(row);
    await record(actor, 'proposal.overridden', proposal, { hash, torque, name, share, reason: overridden.reason });
  });
  return readProposal(actor, id);
}
