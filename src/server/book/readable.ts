import { may, type Actor } from '@/domain/people/may';

/** The books a person may read, as the database names them, for a list that shows no more than that. */
export interface Readable {
  common: boolean;
  shopIds: string[];
}

/** Asks `may` of the common book and of each shop the person belongs to; nobody reads other books. */
export function readableBooks(actor: Actor): Readable {
  const own = new Set(actor.memberships.flatMap((m) => (m.in === 'shop' ? [m.shopId] : [])));
  return {
    common: may(actor, 'readBook', { book: { kind: 'common' } }).ok,
    shopIds: [...own].filter((shopId) => may(actor, 'readBook', { book: { kind: 'shop', shopId } }).ok),
  };
}

/** The condition on `procedures p` that keeps a query to these books; give `replacements` with it. */
export function inReadableBooks({ common, shopIds }: Readable) {
  const kinds = [
    ...(common ? [`p.bookKind = 'common'`] : []),
    ...(shopIds.length > 0 ? ['p.shopId IN (:shopIds)'] : []),
  ];
  return { where: kinds.length > 0 ? `(${kinds.join(' OR ')})` : '0', replacements: { shopIds } };
}
