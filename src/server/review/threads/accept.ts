import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { toSource } from '@/domain/procedure/canonical';
import { applySuggestion } from '@/domain/review/suggestions';
import { mayAccept } from '@/domain/review/threads';
import { parsedText } from '../../book/parsed';
import { now } from '../../clock';
import { app } from '../../context';
import { conflict } from '../../refusal';
import { columnsOf, refuseUnreadable, weigh } from '../draftText';
import { readProposal } from '../readProposal';
import { record } from '../record';
import { keepVersion } from '../versions/keep';
import { insist, insistOnVersion } from './guard';
import { readableThread } from './read';

/**
 * Takes a suggestion up into the author's draft and resolves it; both are stored or neither is. Refuses 409 while the
 * text is under review, and where what it would replace no longer stands; 422 a draft that cannot be read.
 *
 * @param version of the proposal
 */
export async function acceptSuggestion(actor: Actor, id: string, version: number | null = null): Promise<Proposal> {
  const { thread, proposal: before } = await readableThread(actor, id);
  insist(mayAccept(actor, before.facts, thread.facts));
  insistOnVersion(version, before);
  const parsed = await parsedText(before.source);
  refuseUnreadable(parsed);
  const applied = thread.suggestion && applySuggestion(parsed.procedure, thread.anchor, thread.suggestion);
  if (!applied?.ok) throw conflict(applied?.why ?? '');
  const text = await weigh(toSource(applied.procedure), before.parentId);
  refuseUnreadable(text.parsed);
  const { db } = await app();
  await db.write(async () => {
    const { thread: current, proposal } = await readableThread(actor, id);
    insist(mayAccept(actor, proposal.facts, current.facts));
    insistOnVersion(before.version, proposal);
    const at = now();
    await db.models.Revision.update(
      { ...columnsOf(text), version: proposal.version + 1 },
      { where: { id: proposal.id } },
    );
    const { reason, parentId } = proposal;
    const { personId } = actor;
    const { source } = text;
    await keepVersion(proposal, { revisionId: proposal.id, kind: 'suggestion', personId, source, reason, parentId });
    await db.models.Thread.update(
      { state: 'resolved', resolvedById: actor.personId, resolvedAt: at, acceptedAt: at, version: current.version + 1 },
      { where: { id } },
    );
    await record(actor, 'thread.accepted', proposal, { thread: id, version: proposal.version + 1, hash: text.hash });
  });
  return readProposal(actor, before.id);
}
