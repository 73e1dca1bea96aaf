import { may, type Actor } from '@/domain/people/may';

/** The rooms of the house, in the order the navigation shows them. */
const PLACES = [
  { key: 'look-up', name: 'Look up', href: '/' },
  { key: 'bulletins', name: 'Bulletins', href: '/bulletins' },
  { key: 'proposals', name: 'Proposals', href: '/proposals' },
  { key: 'flags', name: 'Flags', href: '/flags' },
  { key: 'review-desk', name: 'Review desk', href: '/review-desk' },
  { key: 'handbook', name: 'Handbook', href: '/handbook' },
  { key: 'shop', name: 'Shop', href: '/shop/rules' },
] as const;
export type Place = (typeof PLACES)[number]['key'];

/** Whether somebody may propose anywhere: to the common book, or to a book of a shop they are in. */
export const mayPropose = (actor: Actor) =>
  may(actor, 'propose', { book: { kind: 'common' } }).ok ||
  actor.memberships.some(
    (m) => m.in === 'shop' && may(actor, 'propose', { book: { kind: 'shop', shopId: m.shopId } }).ok,
  );

/** Whether somebody changes the settings of a shop: an owner of theirs, the steward of any. */
export const maySetShops = (actor: Actor) =>
  may(actor, 'manageShops', null).ok ||
  actor.memberships.some((m) => m.in === 'shop' && may(actor, 'changeShopSettings', { shopId: m.shopId }).ok);

/**
 * The places a person may use.
 *
 * @param shopsWithOneEditor ids of shops whose senior technicians and owner stand in for a second editor
 */
export function placesFor(actor: Actor, shopsWithOneEditor: readonly string[]) {
  const open: Record<Place, boolean> = {
    'look-up': true,
    bulletins: true,
    flags: true,
    proposals: mayPropose(actor),
    'review-desk': may(actor, 'seeReviewDesk', { shopsWithOneEditor }).ok,
    handbook: true,
    shop: maySetShops(actor),
  };
  return PLACES.filter(({ key }) => open[key]);
}

/** "Rowan Achterberg" is RA. */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/);
  return [words[0], words.length > 1 ? words.at(-1) : ''].map((word) => word?.charAt(0).toUpperCase() ?? '').join('');
}
