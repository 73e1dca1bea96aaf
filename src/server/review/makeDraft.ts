import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { columnsOf, type Weighed } from './draftText';
import { record } from './record';
import { keepVersion } from './versions/keep';

export interface Draft {
  procedureId: string;
  number: string;
  shopId: string | null;
  /** The revision that the text stands on, and its letter; null for a new procedure. */
  on: { id: string; letter: string } | null;
  text: Weighed;
  reason: string;
}

/** Stores a new draft of the actor's and answers its id. Call it inside a `write`. */
export async function makeDraft(
  actor: Actor,
  { procedureId, number, shopId, on, text, reason }: Draft,
): Promise<string> {
  const { db } = await app();
  const { id } = await db.models.Revision.create({
    procedureId,
    parentId: on?.id ?? null,
    state: 'draft',
    authorId: actor.personId,
    reason,
    ...columnsOf(text),
  });
  const { personId } = actor;
  const parentId = on?.id ?? null;
  await keepVersion(null, { revisionId: id, kind: 'start', personId, source: text.source, reason, parentId });
  await record(actor, 'proposal.started', { id, number, shopId }, { base: on?.letter ?? null });
  return id;
}
