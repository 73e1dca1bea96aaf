import type { RevisionSummary } from '@/domain/api/schemas/book';
import { overText } from '@/domain/review/overrides';
import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { Cell, Row, Table } from '@/components/ui/Table';

const COLUMNS = [
  { key: 'letter', label: 'Revision' },
  { key: 'published', label: 'Published' },
  { key: 'author', label: 'Written by' },
  { key: 'reviewers', label: 'Reviewed by' },
  { key: 'reason', label: 'Reason' },
  { key: 'from', label: 'Compare from' },
  { key: 'to', label: 'to' },
];

const Choice = ({ name, letter, chosen }: { name: 'from' | 'to'; letter: string; chosen: boolean }) => (
  <label className="-my-2 flex min-h-touch cursor-pointer items-center gap-2">
    <input type="radio" name={name} value={letter} defaultChecked={chosen} className="size-5 accent-petrol" />
    <span className="sm:sr-only">
      {name === 'from' ? 'from' : 'to'} {letter}
    </span>
  </label>
);

/**
 * Every published revision, latest first, with a choice of two to compare. A plain form: the comparison has an address.
 */
export function History({
  number,
  revisions,
  withdrawn,
}: {
  number: string;
  revisions: readonly RevisionSummary[];
  withdrawn: boolean;
}) {
  const several = revisions.length > 1;
  return (
    <form action={`/procedures/${number}/compare`} className="px-4 py-3 sm:px-9">
      <Table caption={`Revisions of ${number}`} columns={several ? COLUMNS : COLUMNS.slice(0, 5)}>
        {revisions.map((revision, place) => (
          <Row key={revision.letter}>
            <Cell>
              <a
                href={place === 0 ? `/procedures/${number}` : `/procedures/${number}/revisions/${revision.letter}`}
                className="font-serif text-[1.5rem] font-bold leading-none"
              >
                <span className="sr-only">Revision </span>
                {revision.letter}
              </a>
              <span className="ml-2 text-small text-ink-2">
                {place > 0 ? 'superseded' : withdrawn ? 'withdrawn' : 'current'}
              </span>
            </Cell>
            <Cell label="Published" className="whitespace-nowrap">
              {dayOf(revision.publishedAt)}
            </Cell>
            <Cell label="Written by">{revision.author.name}</Cell>
            <Cell label="Reviewed by">{revision.reviewers.map(({ name }) => name).join(', ') || 'Nobody named'}</Cell>
            <Cell label="Reason" className="max-w-prose">
              <span className="font-serif text-[0.9375rem] italic">{revision.reason || 'None given'}</span>
              {revision.overrides.map(({ torque, share, person, reason, at }) => (
                <p key={torque} className="mt-2 border-l-[8px] border-ink pl-2.5 leading-snug">
                  <b className="font-semibold">{torque}</b>, clamped to {overText(share)} of proof load. {person.name}{' '}
                  overrode the clamp check on {dayOf(at)}: {reason}
                </p>
              ))}
            </Cell>
            {several && (
              <>
                <Cell className="max-sm:inline-block max-sm:pr-6">
                  <Choice name="from" letter={revision.letter} chosen={place === 1} />
                </Cell>
                <Cell className="max-sm:inline-block">
                  <Choice name="to" letter={revision.letter} chosen={place === 0} />
                </Cell>
              </>
            )}
          </Row>
        ))}
      </Table>
      {several ? (
        <div className="flex justify-end border-t border-hair pt-4">
          <Button type="submit" kind="main">
            Compare these two
          </Button>
        </div>
      ) : (
        <p className="pb-3 text-ink-2">This is the first revision. Once it is changed, any two can be compared here.</p>
      )}
    </form>
  );
}
