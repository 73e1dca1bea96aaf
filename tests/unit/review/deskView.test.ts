import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { deskColumns, OWN_COLUMNS } from '@/components/review/deskColumns';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import {
  booksOf,
  DESK_PAGE,
  DESK_SORTS,
  deskAddress,
  deskItems,
  deskPage,
  readDeskView,
  type DeskView,
} from '@/domain/review/deskView';
import { AUTHOR, EDITOR, proposal, SECOND } from '../../factories/proposal';

const read = (query: string) => readDeskView(new URLSearchParams(query));
const WORST: DeskView = { book: '', sort: 'worst', descending: false, page: 1 };

describe('the view that an address asks for', () => {
  it('reads the plain desk, a book, a column, and a column the other way round', () => {
    expect(read('')).toEqual(WORST);
    expect(read('book=common&sort=title')).toEqual({ book: 'common', sort: 'title', descending: false, page: 1 });
    expect(read('sort=-waiting&page=3')).toEqual({ book: '', sort: 'waiting', descending: true, page: 3 });
  });

  it.each([
    'sort=',
    'sort=-',
    'sort=colour',
    'sort=--title',
    'sort=-worst',
    'sort=title,author',
    'sort=__proto__',
    'page=0',
    'page=-1',
    'page=1e9',
    'page=two',
  ])('reads what it does not know as the plain desk: %s', (query) => expect(read(query)).toEqual(WORST));

  it('is found again at its own address', () => {
    const view = fc
      .record({
        book: fc.oneof(fc.constant(''), fc.string()),
        sort: fc.constantFrom(...DESK_SORTS),
        turned: fc.boolean(),
        page: fc.integer({ min: 1, max: 999_999 }),
      })
      .map(({ turned, ...asked }): DeskView => ({ ...asked, descending: asked.sort !== 'worst' && turned }));
    fc.assert(
      fc.property(view, (asked) => {
        const { pathname, searchParams } = new URL(deskAddress(asked), 'http://x.example');
        expect(pathname).toBe('/review-desk');
        expect(readDeskView(searchParams)).toEqual(asked);
      }),
    );
  });
});

const shop = (shopId: string, name: string): ProposalSummary['book'] => ({ kind: 'shop', shopId, name });
const waits = ({
  proposedAt = '2026-11-28T09:00:00.000Z',
  ...change
}: Partial<ProposalSummary> & { proposedAt?: string }) => ({
  ...proposal(change),
  proposedAt,
});
const ITEMS = [
  waits({ number: 'P-0142', title: 'Valve cover', author: AUTHOR, agreements: 1 }),
  waits({ number: 'P-0101', title: 'Breather', author: SECOND, proposedAt: '2026-11-20T09:00:00.000Z' }),
  waits({
    number: 'P-1001',
    title: 'Valve cover',
    author: EDITOR,
    book: shop('b', 'Bay Motors'),
    agreementsNeeded: 1,
  }),
  waits({ number: 'P-1002', title: 'Anchor', author: AUTHOR, book: shop('a', 'Anvil Street') }),
];
const shown = (view: Partial<DeskView>) => deskItems(ITEMS, { ...WORST, ...view }).map(({ number }) => number);

describe('the items of a view', () => {
  it('keeps the order of the desk, and leaves out other books', () => {
    expect(shown({})).toEqual(ITEMS.map(({ number }) => number));
    expect(shown({ book: 'common' })).toEqual(['P-0142', 'P-0101']);
    expect(shown({ book: 'a' })).toEqual(['P-1002']);
    expect(shown({ book: 'nobody' })).toEqual([]);
  });

  it('sorts by title with the number deciding, by author, and by what is missing', () => {
    expect(shown({ sort: 'title' })).toEqual(['P-1002', 'P-0101', 'P-0142', 'P-1001']);
    expect(shown({ sort: 'author' })).toEqual(['P-0101', 'P-1001', 'P-0142', 'P-1002']);
    expect(shown({ sort: 'agreed', book: 'common' })).toEqual(['P-0142', 'P-0101']);
  });

  it('takes the longest wait for the largest', () => {
    expect(shown({ sort: 'waiting' }).at(-1)).toBe('P-0101');
    expect(shown({ sort: 'waiting', descending: true })[0]).toBe('P-0101');
  });

  it('shows the same items whatever the order, equals in the order of the desk', () => {
    const views = fc.record({ sort: fc.constantFrom(...DESK_SORTS), descending: fc.boolean() });
    fc.assert(
      fc.property(views, (view) => {
        expect([...shown(view)].sort()).toEqual([...shown({})].sort());
      }),
    );
    const equals = ITEMS.map((item) => ({ ...item, author: AUTHOR }));
    for (const descending of [false, true])
      expect(deskItems(equals, { ...WORST, sort: 'author', descending })).toEqual(equals);
  });

  it('does not touch the list that it was given', () => {
    const before = [...ITEMS];
    deskItems(ITEMS, { ...WORST, sort: 'title' });
    expect(ITEMS).toEqual(before);
  });
});

describe('the pages of a desk', () => {
  const many = fc.integer({ min: 0, max: 400 }).map((n) => Array.from({ length: n }, (_, i) => i));

  it('together hold every proposal once, in order, none longer than a page', () => {
    fc.assert(
      fc.property(many, (items) => {
        const { last } = deskPage(items, { page: 1 });
        const pages = Array.from({ length: last }, (_, i) => deskPage(items, { page: i + 1 }));
        expect(pages.flatMap((page) => page.items)).toEqual(items);
        expect(pages.every((page) => page.items.length <= DESK_PAGE)).toBe(true);
        expect(pages.map(({ from }) => from)).toEqual(pages.map((_, i) => i * DESK_PAGE));
      }),
    );
  });

  it('end with the last: an address that asks for more, as after an afternoon of reviewing, gets that one', () => {
    const items = Array.from({ length: DESK_PAGE + 1 }, (_, i) => i);
    expect(deskPage(items, { page: 7 })).toEqual({ items: [DESK_PAGE], page: 2, from: DESK_PAGE, last: 2 });
    expect(deskPage([], { page: 7 })).toEqual({ items: [], page: 1, from: 0, last: 1 });
  });
});

it('lists each book once, the common one first, then by name', () => {
  expect(booksOf([...ITEMS].reverse())).toEqual([
    { value: 'common', label: 'Common book' },
    { value: 'a', label: 'Anvil Street' },
    { value: 'b', label: 'Bay Motors' },
  ]);
  expect(booksOf([])).toEqual([]);
});

describe('the columns of the desk', () => {
  it('lead to the first page of their order', () => {
    expect(column({ page: 4 }, 'what')?.href).toBe('/review-desk?sort=title');
  });

  const column = (view: Partial<DeskView>, key: string) =>
    deskColumns({ ...WORST, ...view }).find((found) => found.key === key);

  it('lead to their order and, once they have it, to the other way round and back', () => {
    expect(column({}, 'what')).toMatchObject({ href: '/review-desk?sort=title', sorted: undefined });
    expect(column({ sort: 'title' }, 'what')).toMatchObject({ href: '/review-desk?sort=-title', sorted: 'ascending' });
    expect(column({ sort: 'title', descending: true }, 'what')).toMatchObject({
      href: '/review-desk?sort=title',
      sorted: 'descending',
    });
  });

  it('give worst first one direction only, and keep the book', () => {
    expect(column({ book: 'common' }, 'why')).toMatchObject({ href: '/review-desk?book=common', sorted: 'descending' });
    expect(column({ sort: 'title', book: 'common' }, 'why')).toMatchObject({ href: '/review-desk?book=common' });
  });

  it("never sort one's own", () => {
    expect(OWN_COLUMNS.map(({ href }) => href)).toEqual(OWN_COLUMNS.map(() => undefined));
    expect(OWN_COLUMNS.map(({ label }) => label)).toEqual(deskColumns(WORST).map(({ label }) => label));
  });
});
