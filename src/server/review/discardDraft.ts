import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { dropEvidence } from '../photos/evidence';
import { Refusal } from '../refusal';
import { guard, readableProposal } from './guard';
import { record } from './record';

/** Throws away a draft that was never sent in; the number of a procedure that was never more than that is free again. */
export async function discardDraft(actor: Actor, id: string, version: number | null = null): Promise<void> {
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    guard({ act: 'edit' }, actor, proposal, version);
    if (proposal.facts.everProposed)
      throw new Refusal(
        409,
        'conflict',
        'Not as things stand',
        'This proposal was sent in once, so it stays in the record. Leave it, or send it in again.',
      );
    const { Procedure, Revision } = db.models;
    await dropEvidence(id);
    await Revision.destroy({ where: { id } });
    const { procedureId } = proposal;
    if ((await Revision.count({ where: { procedureId } })) === 0)
      await Procedure.destroy({ where: { id: procedureId } });
    await record(actor, 'proposal.discarded', proposal, { hash: proposal.hash });
  });
}
