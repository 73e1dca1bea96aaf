import type { ListQuery, Page } from './schemas/common';

/**
 * The part of a sorted list that a caller asked for. The cursor is the key of the last entry that the
 * caller has; where that entry has left the list meanwhile, the list starts again.
 */
export function page<T>(all: readonly T[], { cursor, limit }: ListQuery, keyOf: (item: T) => string): Page<T> {
  const from = cursor === undefined ? 0 : all.findIndex((item) => keyOf(item) === cursor) + 1;
  const items = all.slice(from, from + limit);
  const last = items.at(-1);
  return { items, next: last !== undefined && from + limit < all.length ? keyOf(last) : null };
}
