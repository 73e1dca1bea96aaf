import { may, type Actor } from '@/domain/people/may';
import { currentShop } from '../accounts/currentShop';
import { forbidden, notFound } from '../refusal';
import { shopsToSet, type Shop } from './rules';

/**
 * The shop that the rules page is about, and the others that the actor may turn to: the one asked for, else the one that
 * they work in now, else their first.
 *
 * @throws Refusal 403 for those who set rules in no shop; 404 or 403, as `may` says, for a shop asked for
 */
export async function shopOfRulesPage(actor: Actor, asked: string | null): Promise<{ shop: Shop; shops: Shop[] }> {
  const shops = await shopsToSet(actor);
  const wanted = asked ?? (await currentShop(actor));
  const shop = shops.find(({ id }) => id === wanted) ?? (asked === null ? shops[0] : undefined);
  if (shop) return { shop, shops };
  const permission = may(actor, 'changeShopSettings', { shopId: wanted ?? '' });
  if (asked !== null && (permission.ok || !permission.visible)) throw notFound();
  throw forbidden('The owner of a shop or the network steward sets its rules of thumb.');
}
