import { capital } from '@/domain/wording';
import { Fragment, type ReactNode } from 'react';
import { beyondName, isAtTheBench, type ValueRow } from '@/domain/revision/valueRows';
import type { Side, Span } from '@/domain/revision/sideText';
import type { ClampChange } from '@/domain/revision/types';
import { ClampRow } from './ClampRow';
import { Mark, Spans } from './Spans';

/** "10 ±1 N·m": the number large, its unit smaller. */
const UNIT = /^(.*\d)(\D{1,12})$/s;

function Value({ spans, side, prose }: { spans: readonly Span[] | null; side: Side; prose: boolean }) {
  if (!spans) return <span className="value-none">{side === 'old' ? 'Not there' : 'Left out'}</span>;
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

const reasonOf = ({ critical }: ValueRow) => (critical ? `${capital(critical.replace(/: [^:]*$/, ''))}.` : null);

interface RowsProps {
  rows: readonly ValueRow[];
  names: { old: string; now: string };
  below: (path: string) => ReactNode;
  acts: (row: ValueRow) => ReactNode;
  /** Clamp load of the torque whose rows end with this one. */
  loadUnder: (i: number) => ClampChange | undefined;
  onLoad: (torque: string) => ReactNode;
}

const RowHead = ({ row, span, acts }: { row: ValueRow; span?: number } & Pick<RowsProps, 'acts'>) => (
  <th scope="row" colSpan={span}>
    <span className="font-semibold">{row.label}</span>
    {row.detail && row.detail !== row.to && <span className="value-detail">{row.detail}</span>}
    {acts(row)}
  </th>
);

/** What was written about a value stands under it, as wide as the table. */
function Below({ children, span }: { children: ReactNode; span: number }) {
  const nothing = children === null || (Array.isArray(children) && children.length === 0);
  return nothing ? null : (
    <tr className="value-below">
      <td colSpan={span}>{children}</td>
    </tr>
  );
}

/** Values of a new sheet: what stands there, with nothing to set it against. */
const FreshRows = ({ rows, below, acts, loadUnder, onLoad }: Omit<RowsProps, 'names'>) =>
  rows.map((row, i) => {
    const load = loadUnder(i);
    const text = beyondName(row);
    return (
      <Fragment key={row.path}>
        <tr id={`value-${row.path}`} data-goes-on={load ? '' : undefined}>
          <RowHead row={row} span={text ? 1 : 2} acts={acts} />
          {text && <td className={row.prose ? 'value-prose' : 'value-number'}>{text}</td>}
        </tr>
        {load && (
          <ClampRow load={load} columns={2} fresh>
            {onLoad(load.key)}
          </ClampRow>
        )}
        <Below span={2}>{below(row.path)}</Below>
      </Fragment>
    );
  });

/** Old and new of each value. What a cell holds stands in one block, so that a phone can set its name beside it. */
const ChangeRows = ({ rows, names, below, acts, loadUnder, onLoad }: RowsProps) =>
  rows.map((row, i) => {
    const load = loadUnder(i);
    const cell = row.prose ? 'value-prose' : 'value-number';
    const change = row.percent === null ? CHANGE_WORDS[row.kind] : percentText(row.percent);
    const why = reasonOf(row);
    return (
      <Fragment key={row.path}>
        <tr id={`value-${row.path}`} data-goes-on={load ? '' : undefined}>
          <RowHead row={row} acts={acts} />
          <td data-label={names.old} className={cell}>
            <div>
              <Value spans={row.old} side="old" prose={row.prose} />
            </div>
          </td>
          <td data-label={names.now} className={cell}>
            <div>
              <Value spans={row.now} side="new" prose={row.prose} />
            </div>
          </td>
          <td data-label="Change" data-empty={change || row.effect ? undefined : ''} className="value-number">
            <div>
              {change && <span className={row.percent === null ? 'value-none' : 'whitespace-nowrap'}>{change}</span>}
              {row.effect && <span className="value-effect">{row.effect}</span>}
            </div>
          </td>
          <td data-label="Critical" data-empty={why ? undefined : ''}>
            <div className={why ? undefined : 'value-none'}>{why ?? 'No'}</div>
          </td>
        </tr>
        {load && (
          <ClampRow load={load} columns={5} fresh={false}>
            {onLoad(load.key)}
          </ClampRow>
        )}
        <Below span={5}>{below(row.path)}</Below>
      </Fragment>
    );
  });

/** Once for each torque: under its final value where that changes, else under the last of its rows. */
const loadsOf = (rows: readonly ValueRow[], clamp: readonly ClampChange[]) => (i: number) => {
  const row = rows[i];
  if (row?.list !== 'torques') return undefined;
  const own = rows.filter(({ list, key }) => list === 'torques' && key === row.key);
  const under = own.find(({ path }) => path.endsWith('.nm')) ?? own.at(-1);
  return under === row ? clamp.find(({ key }) => key === row.key) : undefined;
};

/**
 * Values that differ, those that hands act on first and apart from the rest.
 * `below` stands under a value's name: remarks on it. `onLoad` stands with the clamp load of a torque, by its key.
 */
export function ValueTable({
  rows,
  clamp,
  fresh,
  names,
  below = () => null,
  acts = () => null,
  onLoad = () => null,
}: {
  rows: readonly ValueRow[];
  /** Clamp load then and now of the torques among them. */
  clamp: readonly ClampChange[];
  /** A new sheet: there is nothing to compare with. */
  fresh: boolean;
  /** What the two texts are called. */
  names: { old: string; now: string };
  below?: (path: string) => ReactNode;
  /** What can be done with a value, under its name. */
  acts?: (row: ValueRow) => ReactNode;
  onLoad?: (torque: string) => ReactNode;
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
          <p className="mt-2 text-ink-2">No value does: no torque, limit, caution, time, part, supply or tool.</p>
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
              {fresh ? (
                <FreshRows rows={shown} below={below} acts={acts} loadUnder={loadsOf(shown, clamp)} onLoad={onLoad} />
              ) : (
                <ChangeRows
                  rows={shown}
                  names={names}
                  below={below}
                  acts={acts}
                  loadUnder={loadsOf(shown, clamp)}
                  onLoad={onLoad}
                />
              )}
            </tbody>
          </table>
        )}
      </section>
    ),
  );
}
