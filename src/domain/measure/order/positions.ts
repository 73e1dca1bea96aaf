import { type FieldProblem, numberProblem } from '../worked';

/** Where a bolt stands, seen from its head: [x right, y down] in mm, as a sheet keeps it. Only proportions count. */
export type Position = readonly [x: number, y: number];

/** As in the schema of a torque. */
const FARTHEST = 5000;
const MOST_BOLTS = 200;
/** Two bolts nearer than this, in mm, stand at one place. */
const ONE_PLACE = 0.01;

export const distance = ([ax, ay]: Position, [bx, by]: Position): number => Math.hypot(ax - bx, ay - by);

/** Middle of the rectangle that the bolts stand in. */
export function middleOf(positions: readonly Position[]): Position {
  const half = (axis: 0 | 1) => {
    const values = positions.map((position) => position[axis]);
    return (Math.min(...values) + Math.max(...values)) / 2;
  };
  return [half(0), half(1)];
}

function twice(positions: readonly Position[]): FieldProblem[] {
  return positions.flatMap((position, i) => {
    const other = positions.slice(0, i).findIndex((before) => distance(before, position) < ONE_PLACE);
    const message = `Bolt ${i + 1} stands at the same place as bolt ${other + 1}.`;
    return other < 0 ? [] : [{ field: `positions.${i}`, message }];
  });
}

/** The problems of a list of positions: none at all, too many, no number, too far away, two at one place. */
export function positionProblems(positions: readonly Position[]): FieldProblem[] {
  if (!Array.isArray(positions) || positions.length === 0)
    return [{ field: 'positions', message: 'The positions of the bolts are missing.' }];
  if (positions.length > MOST_BOLTS)
    return [{ field: 'positions', message: `There must be ${MOST_BOLTS} bolts or fewer.` }];
  const bounds = { least: -FARTHEST, most: FARTHEST, say: (bound: number) => `${bound} mm` };
  const problems = positions.flatMap((position: unknown, i) => {
    const [x, y] = Array.isArray(position) ? position : [];
    return [
      ...numberProblem(`positions.${i}.0`, `Bolt ${i + 1}, to the right,`, x, bounds),
      ...numberProblem(`positions.${i}.1`, `Bolt ${i + 1}, down,`, y, bounds),
    ];
  });
  return problems.length > 0 ? problems : twice(positions);
}
