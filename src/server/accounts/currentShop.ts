import type { Actor } from '@/domain/people/may';
import { app } from '../context';

/**
 * The shop that somebody works in now: the one they chose last, if they still hold a role there, else their first by name.
 *
 * @param shopIds of the shops they hold a role in, by name
 */
export const chosenShop = (shopIds: readonly string[], chosen: string | null): string | null =>
  shopIds.find((id) => id === chosen) ?? shopIds[0] ?? null;

/** The id of the shop that the actor works in now; null for those who hold no role in any. */
export async function currentShop(actor: Actor): Promise<string | null> {
  // `whoIs` brings the memberships in the order of the shops' names.
  const shopIds = actor.memberships.flatMap((m) => (m.in === 'shop' ? [m.shopId] : []));
  if (new Set(shopIds).size < 2) return shopIds[0] ?? null;
  const { db } = await app();
  const [person] = await db.read<{ currentShopId: string | null }>(
    'SELECT currentShopId FROM people WHERE id = :personId',
    { personId: actor.personId },
  );
  return chosenShop(shopIds, person?.currentShopId ?? null);
}
