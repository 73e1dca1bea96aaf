import type { Column } from '@/components/ui/Table';
import { deskAddress, type DeskSort, type DeskView } from '@/domain/review/deskView';

const COLUMNS: readonly (Column & { sort?: DeskSort })[] = [
  { key: 'what', label: 'Proposal', sort: 'title' },
  { key: 'who', label: 'By', sort: 'author' },
  { key: 'why', label: 'What it does', sort: 'worst' },
  { key: 'agreed', label: 'Agreed', sort: 'agreed' },
  { key: 'waiting', label: 'Waiting', sort: 'waiting' },
];

/** One's own are few; they are not sorted. */
export const OWN_COLUMNS: readonly Column[] = COLUMNS.map(({ key, label }) => ({ key, label }));

/** The columns of the desk with the address that each sorts by. Worst first has one direction only. */
export const deskColumns = (view: DeskView): Column[] =>
  COLUMNS.map(({ key, label, sort }) => {
    if (!sort) return { key, label };
    const here = view.sort === sort;
    const descending = here && sort !== 'worst' && !view.descending;
    return {
      key,
      label,
      href: deskAddress({ ...view, sort, descending, page: 1 }),
      sorted: here ? (sort === 'worst' || view.descending ? 'descending' : 'ascending') : undefined,
    };
  });
