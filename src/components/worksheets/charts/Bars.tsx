import { scaleBand, scaleLinear } from 'd3-scale';
import { fromBase } from '@/domain/measure/convert';
import { formatNumber, withUnit } from '@/domain/measure/format';
import { show } from '@/domain/measure/said';
import type { BarsChart } from '@/domain/worksheets/charts';
import { boxUnit } from '@/domain/worksheets/readInputs';
import type { Units } from '../asked';
import { apart } from './apart';

const WIDTH = 620;
const HEIGHT = 260;
/** Height of a label beside a line. */
const LABEL = 16;
const EDGE = { top: 22, right: 92, bottom: 30, left: 74 };

/** Fills that stay apart without colour and in print: outline for what was, solid for what is. */
const OUTLINE = 'fill-white stroke-ink';
const SOLID = 'fill-petrol stroke-petrol';
const LOOKS = [OUTLINE, SOLID, 'fill-side stroke-ink'] as const;

/** The last of several series is the one that counts, and a single one is it. */
const lookOf = (series: number, of: number): string => (of === 1 ? SOLID : (LOOKS[series % LOOKS.length] ?? OUTLINE));

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

/** Lines at one height share a label; labels of near ones move apart so that each can be read. */
function lineLabels(lines: readonly { value: number; word: string }[], y: (value: number) => number) {
  const merged: { value: number; words: string[] }[] = [];
  for (const { value, word } of lines) {
    const same = merged.find((label) => label.value === value);
    if (same) same.words.push(word);
    else merged.push({ value, words: [word] });
  }
  const places = apart(
    merged.map(({ value }) => y(value)),
    LABEL,
  );
  return merged.map((label, i) => ({ ...label, at: places[i] ?? y(label.value) }));
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
  // The axis is divided in the unit that is read, so that its marks stand at round figures.
  const unit = boxUnit(chart.unit, units);
  const scale = scaleLinear()
    .domain(extent(chart).map((base) => fromBase(base, unit)))
    .range([HEIGHT - EDGE.bottom, EDGE.top])
    .nice(5);
  const y = (base: number) => scale(fromBase(base, unit));
  const lines = [
    { value: chart.band?.max, word: 'most' },
    { value: chart.nominal, word: 'nominal' },
    { value: chart.band?.min, word: 'least' },
  ].filter((line): line is { value: number; word: string } => line.value !== undefined);
  const label = (base: number) => show(base, chart.unit, chart.fineness)[units];
  const ticks = scale.ticks(5);
  const floor = HEIGHT - EDGE.bottom;
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      className="block w-full max-w-[46rem] font-sans text-[13px]"
      aria-hidden="true"
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={EDGE.left} x2={WIDTH - EDGE.right} y1={scale(tick)} y2={scale(tick)} className="stroke-hair" />
          <text x={EDGE.left - 8} y={scale(tick) + 4} textAnchor="end" className="fill-ink-2">
            {withUnit(formatNumber(Number(tick.toPrecision(9))), unit)}
          </text>
        </g>
      ))}
      {chart.items.map((item) => (
        <g key={item}>
          {chart.series.map(({ label: name, values }, s) => {
            const value = values[chart.items.indexOf(item)] ?? null;
            const x = (groups(item) ?? 0) + (bars(name) ?? 0);
            const bottom = Math.min(floor, scale(Math.max(scale.domain()[0] ?? 0, 0)));
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
                className={`${lookOf(s, chart.series.length)} [print-color-adjust:exact]`}
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
        </g>
      ))}
      {lineLabels(lines, y).map(({ value, words, at }) => (
        <g key={value}>
          <line
            x1={WIDTH - EDGE.right}
            x2={WIDTH - EDGE.right + 8}
            y1={y(value)}
            y2={at}
            strokeWidth={1}
            className="stroke-ink"
          />
          <text x={WIDTH - EDGE.right + 12} y={at + 4} className="fill-ink">
            {words.join(', ')} {label(value).replace(/ .*$/, '')}
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
              className={`${lookOf(s, chart.series.length)} [print-color-adjust:exact]`}
            />
          </svg>
          {label}
        </span>
      ))}
    </p>
  );
