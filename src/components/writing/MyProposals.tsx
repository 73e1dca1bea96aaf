import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { dayOf } from '@/components/ui/day';
import { EmptyState } from '@/components/ui/EmptyState';
import { Cell, Row, Table, type Column } from '@/components/ui/Table';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import {
  MINE_SHOWN,
  mineAddress,
  viewMine,
  waitsFor,
  type MineView,
  type Shown,
  type Sort,
} from '@/domain/review/mine';

const STATE_WORDS: Record<ProposalSummary['state'], string> = {
  draft: 'Draft',
  proposed: 'Proposed',
  returned: 'Returned to you',
  declined: 'Declined',
  published: 'Published',
  superseded: 'Published, superseded since',
};

const isOpen = ({ state }: ProposalSummary) => state === 'draft' || state === 'returned';

/** Throws a draft away, after a second press that says what it does. Works without a script. */
const Discard = ({ proposal }: { proposal: ProposalSummary }) => (
  <details className="relative sm:-my-3">
    <summary className="inline-flex min-h-touch cursor-pointer items-center text-small font-semibold text-petrol underline underline-offset-[3px]">
      Discard<span className="sr-only"> the draft of {proposal.title}</span>
    </summary>
    <form method="post" className="frame z-10 flex w-64 flex-col gap-2 p-3 text-left sm:absolute sm:right-0">
      <input type="hidden" name="discard" value={proposal.id} />
      <input type="hidden" name="version" value={proposal.version} />
      <p className="leading-snug">The draft is thrown away and cannot be brought back.</p>
      <Button type="submit">Discard the draft</Button>
    </form>
  </details>
);

const Filters = ({ view }: { view: MineView }) => (
  <nav aria-label="Which proposals" className="flex flex-wrap gap-x-6 px-5 sm:px-9">
    {(Object.keys(MINE_SHOWN) as Shown[]).map((show) => (
      <a
        key={show}
        href={mineAddress({ ...view, show })}
        aria-current={show === view.show ? 'true' : undefined}
        className="inline-flex min-h-touch items-center border-b-[3px] border-transparent pt-[3px] font-medium text-ink-2 no-underline hover:text-ink aria-[current]:border-petrol aria-[current]:text-ink"
      >
        {MINE_SHOWN[show]}
      </a>
    ))}
  </nav>
);

function columnsOf(view: MineView): Column[] {
  const sorted = (sort: Sort, label: string, down: boolean): Column => ({
    key: sort,
    label,
    href: mineAddress({ ...view, sort, turned: view.sort === sort && !view.turned }),
    sorted: view.sort === sort ? (view.turned === down ? 'ascending' : 'descending') : undefined,
  });
  return [
    sorted('title', 'Procedure', false),
    sorted('state', 'State', false),
    { key: 'waits', label: 'Waits for' },
    sorted('updated', 'Changed', true),
    { key: 'discard', label: 'Discard', align: 'right' },
  ];
}

const Line = ({ proposal }: { proposal: ProposalSummary }) => (
  <Row>
    <Cell>
      <a
        href={isOpen(proposal) ? `/proposals/${proposal.id}/edit` : `/proposals/${proposal.id}`}
        className="font-serif font-bold text-ink"
      >
        {proposal.title}
      </a>
      <span className="block text-small text-ink-2">
        {proposal.number}, {proposal.base ? `changing ${proposal.base}` : 'new'}, {proposal.book.name}
      </span>
    </Cell>
    <Cell label="State">{STATE_WORDS[proposal.state]}</Cell>
    <Cell label="Waits for">{waitsFor(proposal)}</Cell>
    <Cell label="Changed">{dayOf(proposal.updatedAt)}</Cell>
    <Cell align="right">{proposal.state === 'draft' && !proposal.proposedAt && <Discard proposal={proposal} />}</Cell>
  </Row>
);

/** Everything that somebody has written or begun to write, what waits for them first. */
export function MyProposals({
  proposals,
  view,
  said,
}: {
  proposals: readonly ProposalSummary[];
  view: MineView;
  /** What just happened, or what could not be done. */
  said: string | null;
}) {
  const shown = viewMine(proposals, view);
  return (
    <div className="leaf framed-sections">
      <div className="flex flex-wrap items-center justify-between gap-4 px-5 py-5 sm:px-9">
        <h1 className="text-title">My proposals</h1>
        <ButtonLink href="/procedures/new">Write a new procedure</ButtonLink>
      </div>
      {said && (
        <p role="status" className="px-5 py-3 font-semibold sm:px-9">
          {said}
        </p>
      )}
      {proposals.length === 0 ? (
        <EmptyState title="You have not proposed anything yet">
          <p>
            Look up the sheet that you know a better way for, and press <b>Propose a change</b> on it, or <b>Change</b>{' '}
            beside one of its steps. Your draft is kept here until you send it in.
          </p>
          <ButtonLink kind="main" href="/">
            Look up a sheet
          </ButtonLink>
        </EmptyState>
      ) : (
        <div>
          <Filters view={view} />
          <div className="border-t border-rule px-5 pb-3 sm:px-9">
            {shown.length === 0 ? (
              <p className="py-8 text-ink-2">
                Nothing here. <a href={mineAddress({ ...view, show: 'all' })}>Show all {proposals.length}</a>.
              </p>
            ) : (
              <Table caption="My proposals" columns={columnsOf(view)}>
                {shown.map((proposal) => (
                  <Line key={proposal.id} proposal={proposal} />
                ))}
              </Table>
            )}
          </div>
        </div>
      )}
    </div>
  );
}
