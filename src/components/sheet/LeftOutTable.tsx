import { Cell, Row, Table } from '@/components/ui/Table';
import type { LeftOut } from '@/domain/api/schemas/imports';

/** What a document held that is not in the draft, or not as it was. */
export function LeftOutTable({ leftOut }: { leftOut: readonly LeftOut[] }) {
  return (
    <Table
      caption="What is not as it was in the document"
      columns={[
        { key: 'what', label: 'What' },
        { key: 'where', label: 'Where' },
        { key: 'quote', label: 'Its words' },
        { key: 'became', label: 'In the draft' },
      ]}
    >
      {leftOut.map(({ what, where, quote, became }, i) => (
        <Row key={`${i} ${what}`}>
          <Cell label="What">
            <b className="font-semibold">{what}</b>
          </Cell>
          <Cell label="Where">{where}</Cell>
          <Cell label="Its words">
            {quote ? (
              <span className="[overflow-wrap:anywhere]">{quote}</span>
            ) : (
              <span className="text-ink-2">none</span>
            )}
          </Cell>
          <Cell label="In the draft">{became ?? 'left out'}</Cell>
        </Row>
      ))}
    </Table>
  );
}
