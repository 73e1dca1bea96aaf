import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { app } from '../../context';
import { columnsOf, weigh } from '../draftText';
import { guard, readableProposal } from '../guard';
import { readProposal } from '../readProposal';
import { record } from '../record';
import { keepVersion } from './keep';
import { loadVersion } from './read';

/**
 * Goes back to an earlier version: its text, its reason and the revision it stood on become the draft's again, as a new
 * version. Nothing is deleted. A version on an older base makes the draft one that can be brought up to date again.
 *
 * @param version of the draft that the author saw; 409 where another stands now
 */
export async function restoreVersion(actor: Actor, id: string, n: number, version: number | null): Promise<Proposal> {
  const before = await readableProposal(actor, id);
  guard({ act: 'edit' }, actor, before, version);
  const { row, source } = await loadVersion(actor, id, n);
  const { parentId, reason } = row;
  const text = await weigh(source, parentId);
  const { db } = await app();
  await db.write(async () => {
    const draft = await readableProposal(actor, id);
    guard({ act: 'edit' }, actor, draft, version ?? before.version);
    if (draft.source === source && draft.reason === reason && draft.parentId === parentId) return;
    await db.models.Revision.update(
      { ...columnsOf(text), parentId, reason, version: draft.version + 1 },
      { where: { id } },
    );
    await keepVersion(draft, {
      revisionId: id,
      kind: 'restore',
      ofN: n,
      personId: actor.personId,
      source,
      reason,
      parentId,
    });
    await record(actor, 'proposal.restored', draft, { version: draft.version + 1, hash: text.hash, of: n });
  });
  return readProposal(actor, id);
}
