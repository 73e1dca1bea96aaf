import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import type { Agreement } from '@/domain/review/rules';
import { now } from '../clock';
import { app } from '../context';
import { guard, readableProposal } from './guard';
import type { Loaded } from './proposals';
import { readProposal } from './readProposal';
import { record } from './record';

/** Stores an agreement that the rules have accepted. Call it inside a `write`. */
export async function recordAgreement(proposal: Loaded, { personId, hash, base }: Agreement): Promise<void> {
  const { db } = await app();
  await db.models.Agreement.create({ revisionId: proposal.id, personId, hash, base, at: now() });
  await record({ personId }, 'proposal.agreed', proposal, { hash, base });
}

/** Agrees to the text as it stands, on the base it stands on; when either changes the agreement no longer counts. */
export async function agree(actor: Actor, id: string, version: number | null = null): Promise<Proposal> {
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    const { given } = guard({ act: 'agree' }, actor, proposal, version);
    if (given) await recordAgreement(proposal, given);
  });
  return readProposal(actor, id);
}
