import type { Actor } from '@/domain/people/may';
import type { Words } from '@/domain/writing/textChanges';
import { refuseOverlong } from '../../book/check';
import { app } from '../../context';
import { guard, readableProposal } from '../guard';
import { keepVersion } from './keep';

/** Keeps words as a version without making them the draft's: what somebody typed before they took another tab's text. */
export async function setAside(actor: Actor, id: string, { source, reason }: Words): Promise<void> {
  refuseOverlong(source);
  const { db } = await app();
  await db.write(async () => {
    const draft = await readableProposal(actor, id);
    guard({ act: 'edit' }, actor, draft, null);
    const { parentId } = draft;
    await keepVersion(draft, { revisionId: id, kind: 'aside', personId: actor.personId, source, reason, parentId });
  });
}
