import type { BookRef } from '../api/schemas/common';
import type { ProposalSummary } from '../api/schemas/proposals';

/** What the address of the desk can ask for. */
export const DESK_SORTS = ['worst', 'title', 'author', 'agreed', 'waiting'] as const;
export type DeskSort = (typeof DESK_SORTS)[number];

export interface DeskView {
  /** "common" or a shop id; empty for all books. */
  book: string;
  sort: DeskSort;
  descending: boolean;
}

/** The view that an address asks for; what it does not know reads as the plain desk. */
export function readDeskView(query: URLSearchParams): DeskView {
  const [, minus = '', name] = /^(-?)([a-z]+)$/.exec(query.get('sort') ?? '') ?? [];
  const sort = DESK_SORTS.find((known) => known === name) ?? 'worst';
  return { book: query.get('book') ?? '', sort, descending: sort !== 'worst' && minus !== '' };
}

/** The address of a view, as short as it can be. */
export function deskAddress({ book, sort, descending }: DeskView): string {
  const query = new URLSearchParams();
  if (book) query.set('book', book);
  if (sort !== 'worst') query.set('sort', `${descending ? '-' : ''}${sort}`);
  return query.size > 0 ? `/review-desk?${query.toString()}` : '/review-desk';
}

const bookKey = ({ kind, shopId }: BookRef) => (kind === 'common' ? 'common' : (shopId ?? ''));

/** The books that have something waiting, the common one first. */
export function booksOf(items: readonly Pick<ProposalSummary, 'book'>[]): { value: string; label: string }[] {
  const books = new Map(items.map(({ book }) => [bookKey(book), book.name]));
  return [...books]
    .map(([value, label]) => ({ value, label }))
    .sort(
      (a, b) => Number(b.value === 'common') - Number(a.value === 'common') || a.label.localeCompare(b.label, 'en'),
    );
}

const since = (item: ProposalSummary) => item.proposedAt ?? item.updatedAt;
const ORDERS: Record<Exclude<DeskSort, 'worst'>, (a: ProposalSummary, b: ProposalSummary) => number> = {
  title: (a, b) => a.title.localeCompare(b.title, 'en') || a.number.localeCompare(b.number),
  author: (a, b) => a.author.name.localeCompare(b.author.name, 'en'),
  agreed: (a, b) => a.agreementsNeeded - a.agreements - (b.agreementsNeeded - b.agreements),
  // The longest wait is the largest.
  waiting: (a, b) => Date.parse(since(b)) - Date.parse(since(a)),
};

/** The items of a view. `worst` keeps the desk's own order, which also decides between equals. */
export function deskItems<T extends ProposalSummary>(items: readonly T[], { book, sort, descending }: DeskView): T[] {
  const shown = items.filter((item) => !book || bookKey(item.book) === book);
  if (sort === 'worst') return shown;
  const order = ORDERS[sort];
  return shown.sort((a, b) => (descending ? -1 : 1) * order(a, b));
}
