import type { Line } from './matchLines';
import type { Drawn } from './useMatchLines';

const LOOKS: Record<Line['look'], { className: string; strokeWidth: number; strokeDasharray?: string }> = {
  same: { className: 'stroke-rule', strokeWidth: 1 },
  edited: { className: 'stroke-petrol', strokeWidth: 4 },
  moved: { className: 'stroke-petrol', strokeWidth: 2 },
  added: { className: 'stroke-petrol', strokeWidth: 4, strokeDasharray: '5 4' },
  removed: { className: 'stroke-ink-2', strokeWidth: 4, strokeDasharray: '5 4' },
};

/** Between the panes: what belongs together is joined. All that it tells stands in words as well. */
export const Gutter = ({ width, height, lines }: Drawn) => (
  <div data-gutter className="pane-gutter" aria-hidden="true">
    {lines.length > 0 && (
      <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} fill="none">
        {lines.map(({ id, look, d, ticks }) => (
          <g key={id}>
            <path d={d} {...LOOKS[look]} />
            {ticks && <path d={ticks} className="stroke-ink" strokeWidth="2" />}
          </g>
        ))}
      </svg>
    )}
  </div>
);
