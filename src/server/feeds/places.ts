import { may, type Actor } from '@/domain/people/may';

/** What a feed is of: the common book with one shop's own, or the common book alone. */
export type FeedShop = string | null;

/**
 * Whether a person may have a feed of that shop now. Without a shop it is of the common book, for those who read it but
 * belong to no shop as well.
 */
export const mayHaveFeed = (actor: Actor, shopId: FeedShop): boolean =>
  may(actor, 'readBook', { book: shopId === null ? { kind: 'common' } : { kind: 'shop', shopId } }).ok;
