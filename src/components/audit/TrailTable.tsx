import { dayOf } from '@/components/ui/day';
import { Cell, Row, Table } from '@/components/ui/Table';
import type { AuditEntry } from '@/domain/api/schemas/history';
import { actWords, reasonIn } from '@/domain/audit/actWords';

const COLUMNS = [
  { key: 'seq', label: 'Entry' },
  { key: 'at', label: 'When' },
  { key: 'actor', label: 'Who' },
  { key: 'act', label: 'What' },
  { key: 'about', label: 'About' },
  { key: 'shop', label: 'Shop' },
];

function About({ entry: { number, letter } }: { entry: AuditEntry }) {
  if (number === null) return null;
  return (
    <>
      <a href={`/procedures/${number}/revisions`}>{number}</a>
      {letter && `, revision ${letter}`}
    </>
  );
}

/** Entries of the audit trail, latest first. */
export const TrailTable = ({ entries }: { entries: readonly AuditEntry[] }) => (
  <Table caption="The audit trail, latest first" columns={COLUMNS}>
    {entries.map((entry) => {
      const reason = reasonIn(entry.detail);
      return (
        <Row key={entry.seq}>
          <Cell>
            {entry.seq}
            <span className="ml-2 text-small text-ink-2" title={entry.hash}>
              {entry.hash.slice(0, 8)}
            </span>
          </Cell>
          <Cell label="When" className="whitespace-nowrap">
            <time dateTime={entry.at}>
              {dayOf(entry.at)}, {entry.at.slice(11, 16)}
            </time>
          </Cell>
          <Cell label="Who">{entry.actor?.name ?? 'The system'}</Cell>
          <Cell className="max-w-prose">
            {actWords(entry.act)}
            {reason && <p className="font-serif text-[0.9375rem] italic leading-relaxed">{reason}</p>}
          </Cell>
          <Cell label="About" className={entry.number === null ? 'max-sm:hidden' : 'sm:whitespace-nowrap'}>
            <About entry={entry} />
          </Cell>
          <Cell label="Shop" className={entry.shop ? undefined : 'max-sm:hidden'}>
            {entry.shop?.name}
          </Cell>
        </Row>
      );
    })}
  </Table>
);
