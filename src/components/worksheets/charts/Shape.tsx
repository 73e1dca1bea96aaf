import { scaleLinear } from 'd3-scale';
import { show } from '@/domain/measure/said';
import type { ShapeChart } from '@/domain/worksheets/charts';
import type { Units } from '../asked';

const WIDTH = 620;
const ROW = 74;
const EDGE = { top: 40, side: 120, bottom: 24 };

const LOOKS = [
  { line: 'stroke-petrol', dot: 'fill-petrol', dash: undefined },
  { line: 'stroke-ink', dot: 'fill-white stroke-ink', dash: '6 4' },
] as const;

/** Limits at one place share a line. */
function marked(lines: readonly { at: number; word: string }[]) {
  const merged: { at: number; words: string[] }[] = [];
  for (const { at, word } of lines) {
    const same = merged.find((line) => line.at === at);
    if (same) same.words.push(word);
    else merged.push({ at, words: [word] });
  }
  return merged;
}

/** A bore seen from the side, top first: how far each diameter lies from the least, many times too large. */
export function Shape({ chart, units }: { chart: ShapeChart; units: Units }) {
  const known = chart.axes.flatMap(({ diameters }) => diameters).filter((d): d is number => d !== null);
  const marks = [chart.band?.min, chart.nominal, chart.band?.max].filter((d): d is number => d !== undefined);
  const all = [...known, ...marks];
  const [least, most] = [Math.min(...all), Math.max(...all)];
  const room = (most - least) * 0.12 || Math.max(most * 1e-5, 1e-6);
  const x = scaleLinear([least - room, most + room], [EDGE.side, WIDTH - EDGE.side]);
  const y = (row: number) => EDGE.top + row * ROW + ROW / 2;
  const height = EDGE.top + chart.heights.length * ROW + EDGE.bottom;
  const text = (base: number) => show(base, chart.unit, chart.fineness)[units];
  /** Outward from the other axis's point at that height, so that the two never cover each other. */
  const labelAt = (axis: number, row: number, px: number, py: number) => {
    const own = chart.axes[axis]?.diameters[row] ?? 0;
    const other = chart.axes[1 - axis]?.diameters[row] ?? null;
    if (other === own) return { x: px, y: py + (axis === 0 ? -11 : 22), textAnchor: 'middle' as const };
    const left = other === null ? axis === 0 : own < other;
    return { x: px + (left ? -11 : 11), y: py + 4, textAnchor: left ? ('end' as const) : ('start' as const) };
  };
  const lines = [
    { at: chart.band?.min, word: 'least' },
    { at: chart.nominal, word: 'nominal' },
    { at: chart.band?.max, word: 'most' },
  ].filter((line): line is { at: number; word: string } => line.at !== undefined);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${height}`}
      className="block w-full max-w-[46rem] font-sans text-[13px]"
      aria-hidden="true"
    >
      {marked(lines).map(({ at, words }) => (
        <g key={at}>
          <line
            x1={x(at)}
            x2={x(at)}
            y1={EDGE.top}
            y2={height - EDGE.bottom}
            className="stroke-rule"
            strokeDasharray={words.join() === 'nominal' ? '5 4' : undefined}
            strokeWidth={1.5}
          />
          <text x={x(at)} y={EDGE.top - 22} textAnchor="middle" className="fill-ink-2">
            {words.join(', ')}
          </text>
          <text x={x(at)} y={EDGE.top - 7} textAnchor="middle" className="fill-ink-2">
            {text(at)}
          </text>
        </g>
      ))}
      {chart.heights.map((name, row) => (
        <text key={name} x={0} y={y(row) + 4} className="fill-ink font-medium">
          {name}
        </text>
      ))}
      {chart.axes.map(({ label, diameters }, a) => {
        const look = LOOKS[a % LOOKS.length] ?? LOOKS[0];
        const points = diameters.flatMap((d, row) => (d === null ? [] : [[x(d), y(row), d, row] as const]));
        return (
          <g key={label}>
            <polyline
              points={points.map(([px, py]) => `${px},${py}`).join(' ')}
              fill="none"
              strokeWidth={2}
              strokeDasharray={look.dash}
              className={look.line}
            />
            {points.map(([px, py, d, row]) => (
              <g key={py}>
                <circle cx={px} cy={py} r={5} strokeWidth={1.6} className={`${look.dot} [print-color-adjust:exact]`} />
                <text {...labelAt(a, row, px, py)} className="fill-ink">
                  {text(d)}
                </text>
              </g>
            ))}
          </g>
        );
      })}
    </svg>
  );
}

export const ShapeKey = ({ chart }: { chart: ShapeChart }) => (
  <p className="flex flex-wrap gap-x-5 gap-y-1">
    {chart.axes.map(({ label }, a) => {
      const look = LOOKS[a % LOOKS.length] ?? LOOKS[0];
      return (
        <span key={label} className="inline-flex items-center gap-2">
          <svg width="30" height="12" aria-hidden="true">
            <line x1="0" x2="30" y1="6" y2="6" strokeWidth={2} strokeDasharray={look.dash} className={look.line} />
            <circle cx="15" cy="6" r="4.5" strokeWidth={1.5} className={look.dot} />
          </svg>
          {label}
        </span>
      );
    })}
  </p>
);
