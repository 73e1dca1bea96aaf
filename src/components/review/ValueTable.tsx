import type { ReactNode } from 'react';
import { isAtTheBench, type ValueRow } from '@/domain/revision/valueRows';
import type { Side, Span } from '@/domain/revision/sideText';
import { Mark, Spans } from './Spans';

/** "10 ±1 N·m": the number large, its unit smaller. */
const UNIT = /^(.*\d)(\D{1,12})$/s;

function Value({ spans, side, prose }: { spans: readonly Span[] | null; side: Side; prose: boolean }) {
  if (!spans) return <span className="text-ink-2">{side === 'old' ? 'Not there' : 'Left out'}</span>;
  const [only, ...more] = spans;
  const [, number, unit] = (!prose && only && more.length === 0 && UNIT.exec(only.text)) || [];
  if (!number) return <Spans spans={spans} side={side} />;
  return (
    <Mark side={side}>
      {number}
      <small>{unit}</small>
    </Mark>
  );
}

const percentText = (percent: number) => {
  const size = Math.abs(percent);
  return `${percent < 0 ? '−' : '+'}${size >= 10 ? Math.round(size) : Math.round(size * 10) / 10} %`;
};

const CHANGE_WORDS: Record<ValueRow['kind'], string> = { added: 'New', removed: 'Removed', changed: '' };

const upper = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function Rows({
  rows,
  fresh,
  below,
}: {
  rows: readonly ValueRow[];
  fresh: boolean;
  below: (path: string) => ReactNode;
}) {
  return rows.map((row) => {
    const why = row.critical ? upper(row.critical.replace(/: [^:]*$/, '')) : null;
    const cell = row.prose ? 'value-prose' : 'value-number';
    return (
      <tr key={row.path} id={`value-${row.path}`}>
        <th scope="row">
          <span className="font-semibold">{row.label}</span>
          {row.detail && <span className="block font-normal text-ink-2">{row.detail}</span>}
          {below(row.path)}
        </th>
        {!fresh && (
          <td data-label="Now" className={cell}>
            <Value spans={row.old} side="old" prose={row.prose} />
          </td>
        )}
        <td data-label={fresh ? 'Value' : 'Proposed'} className={cell}>
          {fresh ? row.to : <Value spans={row.now} side="new" prose={row.prose} />}
        </td>
        {!fresh && (
          <td data-label="Change" className="value-number whitespace-nowrap">
            {row.percent === null ? (
              <span className="text-base font-normal text-ink-2">{CHANGE_WORDS[row.kind]}</span>
            ) : (
              percentText(row.percent)
            )}
          </td>
        )}
        {!fresh && (
          <td data-label="Critical" data-empty={why ? undefined : ''}>
            {why ? `${why}.` : <span className="text-ink-2">No</span>}
          </td>
        )}
      </tr>
    );
  });
}

/**
 * Values that differ, those that hands act on first and apart from the rest.
 * `below` stands under a value's name: remarks on it.
 */
export function ValueTable({
  rows,
  fresh,
  names,
  below = () => null,
}: {
  rows: readonly ValueRow[];
  /** A new sheet: there is nothing to compare with. */
  fresh: boolean;
  /** What the two texts are called. */
  names: { old: string; now: string };
  below?: (path: string) => ReactNode;
}) {
  const groups = [
    { title: fresh ? 'What it tells the bench' : 'What changes at the bench', rows: rows.filter(isAtTheBench) },
    { title: 'Elsewhere on the sheet', rows: rows.filter((row) => !isAtTheBench(row)) },
  ];
  return groups.map(({ title, rows: shown }, i) =>
    shown.length === 0 && (i > 0 || fresh) ? null : (
      <section key={title} aria-label={title} className="review-part">
        <h2 className="text-lead">{title}</h2>
        {shown.length === 0 ? (
          <p className="mt-2 text-ink-2">No value changes; only words do.</p>
        ) : (
          <table className="value-table" data-fresh={fresh || undefined}>
            <caption className="sr-only">{title}</caption>
            <thead>
              <tr>
                <th scope="col">Value</th>
                {!fresh && <th scope="col">{names.old}</th>}
                <th scope="col">{fresh ? 'Text' : names.now}</th>
                {!fresh && <th scope="col">Change</th>}
                {!fresh && <th scope="col">Critical</th>}
              </tr>
            </thead>
            <tbody>
              <Rows rows={shown} fresh={fresh} below={below} />
            </tbody>
          </table>
        )}
      </section>
    ),
  );
}
