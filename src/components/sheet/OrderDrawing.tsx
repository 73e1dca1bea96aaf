import type { Torque } from '@/domain/procedure/schema';
import type { Round } from './orderPasses';
import { place, type Placement } from './placement';

const third = (at: number, of: number, words: readonly [string, string, string]) =>
  words[of === 0 ? 1 : at / of < 0.34 ? 0 : at / of > 0.66 ? 2 : 1];

/** "upper left": where a bolt stands among the others, for somebody who cannot see the drawing. */
function whereabouts(positions: readonly (readonly [number, number])[], bolt: number): string {
  const xs = positions.map(([x]) => x);
  const ys = positions.map(([, y]) => y);
  const [x, y] = positions[bolt - 1] ?? [0, 0];
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  const across = third(x - left, Math.max(...xs) - left, ['left', 'middle', 'right']);
  const down = third(y - top, Math.max(...ys) - top, ['upper', 'middle', 'lower']);
  const words = down === 'middle' ? across : `${down} ${across}`;
  return `${words}, ${Math.round(x - left)} mm across and ${Math.round(y - top)} mm down`;
}

const Outline = ({ drawing }: { drawing: Placement }) => {
  const xs = drawing.bolts.map((bolt) => bolt.x);
  const ys = drawing.bolts.map((bolt) => bolt.y);
  const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  const around = drawing.radius + 8;
  const line = { fill: '#fff', stroke: 'currentColor', strokeWidth: 1.4 };
  return drawing.outline === 'circle' ? (
    <circle cx={(left + right) / 2} cy={(top + bottom) / 2} r={(right - left) / 2 + around} {...line} />
  ) : (
    <rect
      x={left - around}
      y={top - around}
      width={right - left + 2 * around}
      height={bottom - top + 2 * around}
      rx={10}
      {...line}
    />
  );
};

/**
 * Bolts where they stand, seen from their heads. With an order, each shows its turn and the first is filled; without,
 * its place. The same is said in words underneath.
 */
export function OrderDrawing({
  torque,
  rounds = [],
}: {
  torque: Pick<Torque, 'name' | 'positions' | 'order'>;
  /** What is done to each bolt in turn; `orderSteps.ts` steps through them. */
  rounds?: readonly Round[];
}) {
  const { positions, order, name } = torque;
  if (!positions?.length) return null;
  const drawing = place(positions);
  const turns = order ?? positions.map((_, i) => i + 1);
  const caption = order ? 'Tightening order' : 'Places';
  return (
    <figure className="mt-3 break-inside-avoid" data-order={order ? JSON.stringify(rounds) : undefined}>
      <svg
        viewBox={`0 0 ${drawing.width} ${drawing.height}`}
        role="img"
        aria-label={`${caption} of ${turns.length} bolts: ${name}. Read out below.`}
        className="block w-full max-w-[300px] font-sans"
        textAnchor="middle"
        fontWeight={600}
        fontSize={drawing.radius * 1.2}
      >
        <Outline drawing={drawing} />
        {turns.map((bolt, turn) => {
          const at = drawing.bolts[bolt - 1];
          if (!at) return null;
          const first = order !== undefined && turn === 0;
          return (
            <g key={bolt} data-turn={order ? turn + 1 : undefined}>
              <circle
                cx={at.x}
                cy={at.y}
                r={drawing.radius}
                strokeWidth={1.4}
                className={first ? 'fill-petrol stroke-petrol [print-color-adjust:exact]' : 'fill-white stroke-ink'}
              />
              <text x={at.x} y={at.y + drawing.radius * 0.42} className={first ? 'fill-white' : 'fill-ink'}>
                {turn + 1}
              </text>
            </g>
          );
        })}
      </svg>
      {order && <div data-order-steps="" data-needs-script="" className="order-steps" />}
      <figcaption className="mt-1 text-small text-ink-2">
        <details>
          <summary className="inline-flex min-h-7 cursor-pointer items-center underline decoration-rule underline-offset-[3px] print:no-underline">
            {caption} in words
          </summary>
          <ol className="mt-1 list-decimal pl-6">
            {turns.map((bolt) => (
              <li key={bolt}>{whereabouts(positions, bolt)}</li>
            ))}
          </ol>
        </details>
      </figcaption>
    </figure>
  );
}
