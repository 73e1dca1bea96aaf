import type { Photo, PhotoChoice, PhotoList } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { deleteFiles } from '../files/store';
import { guard, readableProposal } from '../review/guard';
import type { Loaded } from '../review/proposals';
import { record } from '../review/record';
import { attachPhotos } from './attach';
import { photosOf } from './load';
import { fullKey, smallKey } from './row';
import { draftOf } from './seen';

/** The photos of a proposal's reason. */
export async function evidenceOf(actor: Actor, proposal: Loaded): Promise<Photo[]> {
  const hanging = { book: proposal.facts.book, ...draftOf(proposal) };
  return (await photosOf(actor, 'proposal', [proposal.id], () => hanging))(proposal.id);
}

/**
 * Adds photos to the reason of one's own draft. Not once it is under review: what is judged does not change; then they go into a
 * thread. Refuses 404, 403 and 409 like an edit, 422 like `attachPhotos`.
 */
export async function addEvidence(actor: Actor, id: string, choices: readonly PhotoChoice[]): Promise<PhotoList> {
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    guard({ act: 'edit' }, actor, proposal, null);
    const noted = await attachPhotos(actor, { type: 'proposal', id }, choices);
    if (noted.photos) await record(actor, 'proposal.evidence', proposal, noted);
  });
  return { items: await evidenceOf(actor, await readableProposal(actor, id)) };
}

/** Throws the photos of a draft away that is thrown away itself. Call it inside the `write` that does so. */
export async function dropEvidence(proposalId: string): Promise<void> {
  const { db } = await app();
  const where = { subjectType: 'proposal' as const, subjectId: proposalId };
  const rows = await db.read<{ id: string }>(
    `SELECT id FROM attachments WHERE subjectType = 'proposal' AND subjectId = :proposalId`,
    { proposalId },
  );
  await db.models.Attachment.destroy({ where });
  if (rows.length > 0) await deleteFiles(rows.flatMap(({ id }) => [fullKey(id), smallKey(id)]));
}
