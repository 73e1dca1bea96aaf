import type { Actor } from '@/domain/people/may';
import { textOf } from '../http/form';
import { malformed, Refusal } from '../refusal';
import { makeFeedKey, revokeFeedKey } from './keys';
import type { FeedShop } from './places';

/** What a form about a feed came to, and which feed it was about. */
export type FeedOutcome =
  | { kind: 'made'; shopId: FeedShop; key: string }
  | { kind: 'revoked'; shopId: FeedShop }
  /** `conflict` is what to tell where the feed was changed meanwhile. */
  | { kind: 'refused'; shopId: FeedShop; conflict: string };

/** Makes, replaces or revokes a feed's key, as the pressed button says. Refuses 400 a form without one, 404. */
export async function actOnFeedForm(actor: Actor, form: FormData): Promise<FeedOutcome> {
  const shopId = textOf(form, 'shop') || null;
  const standing = textOf(form, 'standing') || null;
  const act = textOf(form, 'act');
  try {
    if (act === 'make') return { kind: 'made', shopId, key: await makeFeedKey(actor, shopId, standing) };
    if (act !== 'revoke' || standing === null)
      throw malformed('The form came without what to do. Go back and send it again.');
    await revokeFeedKey(actor, shopId, standing);
    return { kind: 'revoked', shopId };
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 409) throw error;
    return { kind: 'refused', shopId, conflict: error.detail };
  }
}
