import type { ProposalSummary } from '../api/schemas/proposals';

/** How somebody looks through their own proposals. Stands in the address of the page. */
export const MINE_SHOWN = {
  open: 'Open',
  draft: 'Drafts',
  returned: 'Returned',
  proposed: 'Proposed',
  done: 'Done',
  all: 'All',
} as const;
export type Shown = keyof typeof MINE_SHOWN;
export const MINE_SORTS = ['updated', 'title', 'state'] as const;
export type Sort = (typeof MINE_SORTS)[number];

export interface MineView {
  show: Shown;
  sort: Sort;
  /** The other way round than this column is read first. */
  turned: boolean;
}

const OPEN = ['draft', 'returned', 'proposed'];
const ORDER = ['returned', 'draft', 'proposed', 'published', 'superseded', 'declined'];

export function readMineView(query: URLSearchParams): MineView {
  const show = query.get('show') ?? '';
  const sort = query.get('sort') ?? '';
  return {
    show: Object.hasOwn(MINE_SHOWN, show) ? (show as Shown) : 'open',
    sort: MINE_SORTS.find((one) => one === sort) ?? 'updated',
    turned: query.has('turned'),
  };
}

export function mineAddress({ show, sort, turned }: MineView): string {
  const query = new URLSearchParams();
  if (show !== 'open') query.set('show', show);
  if (sort !== 'updated') query.set('sort', sort);
  if (turned) query.set('turned', '');
  const text = query.toString().replace(/=(?=&|$)/g, '');
  return text ? `/proposals?${text}` : '/proposals';
}

const belongs = (state: string, show: Shown) =>
  show === 'all' || (show === 'open' ? OPEN.includes(state) : show === 'done' ? !OPEN.includes(state) : state === show);

const COMPARE: Record<Sort, (a: ProposalSummary, b: ProposalSummary) => number> = {
  updated: (a, b) => b.updatedAt.localeCompare(a.updatedAt),
  title: (a, b) => a.title.localeCompare(b.title, 'en'),
  state: (a, b) => ORDER.indexOf(a.state) - ORDER.indexOf(b.state),
};

/** The proposals that a view shows, in its order; equal ones by the last change. */
export function viewMine(all: readonly ProposalSummary[], { show, sort, turned }: MineView): ProposalSummary[] {
  const way = turned ? -1 : 1;
  return all
    .filter(({ state }) => belongs(state, show))
    .sort((a, b) => way * COMPARE[sort](a, b) || COMPARE.updated(a, b) || a.id.localeCompare(b.id));
}

/** What a proposal waits for, in words. */
export function waitsFor({ state, stale, base, agreementsNeeded, agreements }: ProposalSummary): string {
  if (stale && state !== 'proposed') return `You: revision ${base ?? ''} is no longer current`.replace('  ', ' ');
  switch (state) {
    case 'draft':
      return 'You: finish it and propose it';
    case 'returned':
      return 'You: read the reasons and improve it';
    case 'proposed': {
      const left = agreementsNeeded - agreements;
      if (stale) return 'You: bring it up to the current revision';
      return left <= 0 ? 'An editor to publish it' : left === 1 ? 'An editor to agree' : `${left} editors to agree`;
    }
    case 'declined':
      return 'Nothing, it was declined';
    case 'published':
    case 'superseded':
      return 'Nothing, it was published';
  }
}
