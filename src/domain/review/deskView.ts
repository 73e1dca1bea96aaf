import type { BookRef } from '../api/schemas/common';
import type { DeskItem as ShownItem } from '../api/schemas/proposals';
import type { DeskItem } from './desk';

/** A proposal as far as it must be known to find, count and sort it among the others. */
export interface DeskRow extends DeskItem {
  number: string;
  title: string;
  book: BookRef;
  author: { name: string };
  agreementsNeeded: number;
  stale: boolean;
  next: ShownItem['next'];
}

/** What the address of the desk can ask for. */
export const DESK_SORTS = ['worst', 'title', 'author', 'agreed', 'waiting'] as const;
export type DeskSort = (typeof DESK_SORTS)[number];

export interface DeskView {
  /** "common" or a shop id; empty for all books. */
  book: string;
  sort: DeskSort;
  descending: boolean;
  /** From 1. */
  page: number;
}

/** As many proposals as somebody looks through before going on; a desk of hundreds stays as quick as one of a few. */
export const DESK_PAGE = 25;

/** The view that an address asks for; what it does not know reads as the plain desk. */
export function readDeskView(query: URLSearchParams): DeskView {
  const [, minus = '', name] = /^(-?)([a-z]+)$/.exec(query.get('sort') ?? '') ?? [];
  const sort = DESK_SORTS.find((known) => known === name) ?? 'worst';
  const page = /^[1-9]\d{0,5}$/.exec(query.get('page') ?? '')?.[0] ?? 1;
  return { book: query.get('book') ?? '', sort, descending: sort !== 'worst' && minus !== '', page: Number(page) };
}

/** The address of a view, as short as it can be. */
export function deskAddress({ book, sort, descending, page }: DeskView): string {
  const query = new URLSearchParams();
  if (book) query.set('book', book);
  if (sort !== 'worst') query.set('sort', `${descending ? '-' : ''}${sort}`);
  if (page > 1) query.set('page', `${page}`);
  return query.size > 0 ? `/review-desk?${query.toString()}` : '/review-desk';
}

const bookKey = ({ kind, shopId }: BookRef) => (kind === 'common' ? 'common' : (shopId ?? ''));

/** The books that have something waiting, the common one first. */
export function booksOf(items: readonly Pick<DeskRow, 'book'>[]): { value: string; label: string }[] {
  const books = new Map(items.map(({ book }) => [bookKey(book), book.name]));
  return [...books]
    .map(([value, label]) => ({ value, label }))
    .sort(
      (a, b) => Number(b.value === 'common') - Number(a.value === 'common') || a.label.localeCompare(b.label, 'en'),
    );
}

type Sorted = Pick<DeskRow, 'number' | 'title' | 'book' | 'author' | 'agreements' | 'agreementsNeeded' | 'proposedAt'>;
const ORDERS: Record<Exclude<DeskSort, 'worst'>, (a: Sorted, b: Sorted) => number> = {
  title: (a, b) => a.title.localeCompare(b.title, 'en') || a.number.localeCompare(b.number),
  author: (a, b) => a.author.name.localeCompare(b.author.name, 'en'),
  agreed: (a, b) => a.agreementsNeeded - a.agreements - (b.agreementsNeeded - b.agreements),
  // The longest wait is the largest.
  waiting: (a, b) => Date.parse(b.proposedAt) - Date.parse(a.proposedAt),
};

/** The items of a view. `worst` keeps the desk's own order, which also decides between equals. */
export function deskItems<T extends Sorted>(
  items: readonly T[],
  { book, sort, descending }: Omit<DeskView, 'page'>,
): T[] {
  const shown = items.filter((item) => !book || bookKey(item.book) === book);
  if (sort === 'worst') return shown;
  const order = ORDERS[sort];
  return shown.sort((a, b) => (descending ? -1 : 1) * order(a, b));
}

/** The page of a view that the address asks for; the last one where there are not so many. */
export function deskPage<T>(items: readonly T[], { page }: Pick<DeskView, 'page'>) {
  const last = Math.max(1, Math.ceil(items.length / DESK_PAGE));
  const at = Math.min(page, last);
  const from = (at - 1) * DESK_PAGE;
  return { items: items.slice(from, from + DESK_PAGE), page: at, from, last };
}
