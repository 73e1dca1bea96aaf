import { scaleBand, scaleLinear } from 'd3-scale';
import { fromBase } from '@/domain/measure/convert';
import { formatMeasure } from '@/domain/measure/format';
import { show } from '@/domain/measure/said';
import type { BarsChart } from '@/domain/worksheets/charts';
import type { Units } from '../asked';

const WIDTH = 620;
const HEIGHT = 260;
const EDGE = { top: 22, right: 84, bottom: 30, left: 64 };

/** Fills that stay apart without colour and in print: outline, solid, hatched. */
const LOOKS = ['fill-white stroke-ink', 'fill-petrol stroke-petrol', 'fill-side stroke-ink'] as const;

/** Where the bars begin: zero, or a little below the least where all stand high and near each other. */
function extent(chart: BarsChart): [number, number] {
  const values = [
    ...chart.series.flatMap(({ values }) => values).filter((value): value is number => value !== null),
    ...[chart.band?.min, chart.band?.max, chart.nominal].filter((value): value is number => value !== undefined),
  ];
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const from =
    chart.from === 'least' && least > 0 ? Math.max(0, least - (most - least || most) * 0.6) : Math.min(0, least);
  return [from, most + (most - from) * 0.06 || 1];
}

/** Bars beside each other for each item, limits as lines across. Drawn in the reader's units. */
export function Bars({ chart, units }: { chart: BarsChart; units: Units }) {
  const groups = scaleBand<string>()
    .domain(chart.items)
    .range([EDGE.left, WIDTH - EDGE.right])
    .paddingInner(0.28)
    .paddingOuter(0.14);
  const bars = scaleBand<string>()
    .domain(chart.series.map(({ label }) => label))
    .range([0, groups.bandwidth()]);
  const y = scaleLinear()
    .domain(extent(chart))
    .range([HEIGHT - EDGE.bottom, EDGE.top])
    .nice(5);
  const lines = [
    { value: chart.band?.max, word: 'most' },
    { value: chart.nominal, word: 'nominal' },
    { value: chart.band?.min, word: 'least' },
  ].filter((line): line is { value: number; word: string } => line.value !== undefined);
  const label = (base: number) => show(base, chart.unit, chart.fineness)[units];
  const ticks = y.ticks(5);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      className="block w-full max-w-[46rem] font-sans text-[13px]"
      aria-hidden="true"
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={EDGE.left} x2={WIDTH - EDGE.right} y1={y(tick)} y2={y(tick)} className="stroke-hair" />
          <text x={EDGE.left - 8} y={y(tick) + 4} textAnchor="end" className="fill-ink-2">
            {tickText(tick, chart, units)}
          </text>
        </g>
      ))}
      {chart.items.map((item) => (
        <g key={item}>
          {chart.series.map(({ label: name, values }, s) => {
            const value = values[chart.items.indexOf(item)] ?? null;
            const x = (groups(item) ?? 0) + (bars(name) ?? 0);
            const bottom = y(Math.max(y.domain()[0] ?? 0, Math.min(0, y.domain()[1] ?? 0)));
            return value === null ? (
              <text key={name} x={x + bars.bandwidth() / 2} y={bottom - 6} textAnchor="middle" className="fill-ink-2">
                –
              </text>
            ) : (
              <rect
                key={name}
                x={x + 1}
                width={Math.max(2, bars.bandwidth() - 2)}
                y={Math.min(y(value), bottom)}
                height={Math.max(0.5, Math.abs(bottom - y(value)))}
                strokeWidth={1.4}
                className={`${LOOKS[s % LOOKS.length] ?? ''} [print-color-adjust:exact]`}
              />
            );
          })}
          <text
            x={(groups(item) ?? 0) + groups.bandwidth() / 2}
            y={HEIGHT - EDGE.bottom + 19}
            textAnchor="middle"
            className="fill-ink font-medium"
          >
            {item}
          </text>
        </g>
      ))}
      {lines.map(({ value, word }) => (
        <g key={word}>
          <line
            x1={EDGE.left}
            x2={WIDTH - EDGE.right}
            y1={y(value)}
            y2={y(value)}
            strokeWidth={1.6}
            strokeDasharray={word === 'nominal' ? '5 4' : undefined}
            className="stroke-ink"
          />
          <text x={WIDTH - EDGE.right + 6} y={y(value) + 4} className="fill-ink">
            {word} {label(value).replace(/ .*$/, '')}
          </text>
        </g>
      ))}
      <line
        x1={EDGE.left}
        x2={WIDTH - EDGE.right}
        y1={HEIGHT - EDGE.bottom}
        y2={HEIGHT - EDGE.bottom}
        strokeWidth={1.5}
        className="stroke-ink"
      />
    </svg>
  );
}

/** A tick in the reader's units. Ticks stand at round values of the base unit; three digits are plenty on an axis. */
function tickText(tick: number, chart: BarsChart, units: Units): string {
  const own = Number(fromBase(tick, chart.unit).toPrecision(12));
  return formatMeasure(own, chart.unit)[units];
}

/** What each fill stands for. */
export const BarsKey = ({ chart }: { chart: BarsChart }) =>
  chart.series.length < 2 ? null : (
    <p className="flex flex-wrap gap-x-5 gap-y-1">
      {chart.series.map(({ label }, s) => (
        <span key={label} className="inline-flex items-center gap-2">
          <svg width="18" height="14" aria-hidden="true">
            <rect
              x="1"
              y="1"
              width="16"
              height="12"
              strokeWidth={1.4}
              className={`${LOOKS[s % LOOKS.length] ?? ''} [print-color-adjust:exact]`}
            />
          </svg>
          {label}
        </span>
      ))}
    </p>
  );
