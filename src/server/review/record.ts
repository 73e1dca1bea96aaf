import type { Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import type { Loaded } from './proposals';

/** Writes an act on a proposal into the audit trail. Call it inside the `write` that does the act. */
export function record(
  actor: Pick<Actor, 'personId'>,
  act: `proposal.${string}` | `thread.${string}` | 'revision.published',
  { id, number, shopId }: Pick<Loaded, 'id' | 'number' | 'shopId'>,
  detail: Record<string, unknown> = {},
): Promise<void> {
  return appendAudit({
    actorId: actor.personId,
    act,
    subject: { type: 'revision', id },
    shopId,
    detail: { number, ...detail },
  });
}
