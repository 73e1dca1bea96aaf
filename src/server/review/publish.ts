import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { nextLetter } from '@/domain/revision/letters';
import { indexRevision } from '../book/indexRevision';
import { readRendering } from '../book/rendering';
import { tellOfChange } from '../bulletins/write';
import { now } from '../clock';
import { app } from '../context';
import { recordAgreement } from './agree';
import { weigh } from './draftText';
import { guard, readableProposal } from './guard';
import { readProposal } from './readProposal';
import { record } from './record';

/**
 * Publishes a proposal: it gets the next letter and is the sheet to work from, the one before it is
 * superseded, and search knows its words; all of it is stored or nothing is. Whoever publishes agrees by
 * that. Of two who publish on the same base at once, one gets 409.
 */
export async function publish(actor: Actor, id: string, version: number | null = null): Promise<Proposal> {
  // Made when the text was sent in; asked for here so that nothing is parsed while others wait to write.
  const before = await readableProposal(actor, id);
  // Asked before the text is: a draft that nobody may publish yet need not be readable.
  guard({ act: 'publish' }, actor, before, version);
  const rendered = await readRendering(before);
  const told = (await weigh(before.source, before.parentId)).told();
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    const { given, state } = guard({ act: 'publish' }, actor, proposal, version ?? before.version);
    if (given) await recordAgreement(proposal, given);
    const { Procedure, Revision } = db.models;
    const letter = nextLetter(proposal.current);
    if (proposal.currentRevisionId)
      await Revision.update({ state: 'superseded' }, { where: { id: proposal.currentRevisionId } });
    const publishedAt = now();
    await Revision.update({ state, letter, publishedAt, version: proposal.version + 1 }, { where: { id } });
    await Procedure.update({ currentRevisionId: id }, { where: { id: proposal.procedureId } });
    await tellOfChange({ ...proposal, told, revisionId: id, supersedes: proposal.current, byId: actor.personId });
    await indexRevision(proposal.procedureId, rendered);
    const { hash, current, authorId: author, reason } = proposal;
    await record(actor, 'revision.published', proposal, {
      letter,
      hash,
      supersedes: current,
      author,
      reason,
      publishedAt,
    });
  });
  return readProposal(actor, id);
}
