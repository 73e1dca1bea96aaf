/** The rooms of the house, in the order the navigation shows them. */
export const PLACES = [
  { key: 'look-up', name: 'Look up', href: '/' },
  { key: 'proposals', name: 'Proposals', href: '/proposals' },
  { key: 'review-desk', name: 'Review desk', href: '/review-desk' },
  { key: 'handbook', name: 'Handbook', href: '/handbook' },
] as const;
export type Place = (typeof PLACES)[number]['key'];

interface RoleHeld {
  in: 'shop' | 'common' | 'network';
  shopId: string | null;
  role: string;
}

/**
 * The places a person may use. Whether a senior technician or an owner has a review desk depends on their shop having
 * one editor only, which the desk itself knows: they are shown the way, and the desk says what it holds for them.
 */
export function placesFor(roles: readonly RoleHeld[]) {
  const reviews = roles.some(({ role }) => ['editor', 'senior', 'owner'].includes(role));
  const writes = roles.some(({ role }) => role !== 'apprentice' && role !== 'steward');
  return PLACES.filter(({ key }) => (key === 'proposals' ? writes : key === 'review-desk' ? reviews : true));
}
