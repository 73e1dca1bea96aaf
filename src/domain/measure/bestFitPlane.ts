import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { GAP, OFFSET } from './reach';
import { countProblem, largestOf, meanOf, rangeOf } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** A place on a face and how high it stands there above any level line, all in m. */
export interface FacePoint {
  x: number;
  y: number;
  height: number;
}

export interface PlaneFit {
  /** Highest less lowest place, square to the plane that fits best, m. */
  flatness: number;
  /** How far each place stands above the plane, in the order given. */
  deviations: number[];
  /** Rise of the plane in m for each m along x and y: how far the face was out of level, which is not its fault. */
  slope: { x: number; y: number };
  judged: Judged | null;
}

function pointProblems(points: readonly FacePoint[]): FieldProblem[] {
  const count = countProblem('points', { list: 'The places', one: 'Place' }, points, { atLeast: 4, atMost: 1000 });
  if (count.length > 0) return count;
  return Array.from(points).flatMap((point, place) =>
    (['x', 'y', 'height'] as const).flatMap((name) =>
      numberProblem(`points.${place}.${name}`, `The ${name} of place ${place + 1}`, point?.[name], OFFSET),
    ),
  );
}

/** Sums of products about the centre of the points. */
function moments(points: readonly FacePoint[]) {
  const centre = {
    x: meanOf(points.map(({ x }) => x)),
    y: meanOf(points.map(({ y }) => y)),
    height: meanOf(points.map(({ height }) => height)),
  };
  const about = points.map(({ x, y, height }) => ({ x: x - centre.x, y: y - centre.y, z: height - centre.height }));
  const sum = (of: (point: { x: number; y: number; z: number }) => number) =>
    about.reduce((total, point) => total + of(point), 0);
  return {
    about,
    xx: sum(({ x }) => x * x),
    yy: sum(({ y }) => y * y),
    xy: sum(({ x, y }) => x * y),
    xz: sum(({ x, z }) => x * z),
    yz: sum(({ y, z }) => y * z),
  };
}

/**
 * Flatness of a face from heights at four places or more: the plane that fits best by least squares is taken off, and
 * what is left from lowest to highest is the flatness. The zone of ISO 1101 is never wider, and can be a little
 * narrower, so the answer errs on the careful side. Computed from the normal equations; no published example found.
 *
 * Errors name `points`, `points.<place>.<x|y|height>` or `band`; places that lie on one line make no plane.
 */
export function bestFitPlane(points: readonly FacePoint[], band?: Band): Worked<PlaneFit> {
  const problems = [...pointProblems(points), ...optionalBandProblems('band', 'The flatness allowed', band, GAP)];
  if (problems.length === 0 && onOneLine(points))
    problems.push({ field: 'points', message: 'The places lie on one line; a plane needs some beside it.' });
  return work(problems, 'points', () => {
    const { about, xx, yy, xy, xz, yz } = moments(points);
    const determinant = xx * yy - xy * xy;
    const slope = { x: (xz * yy - yz * xy) / determinant, y: (yz * xx - xz * xy) / determinant };
    const upright = Math.hypot(1, slope.x, slope.y);
    const deviations = about.map(({ x, y, z }) => (z - slope.x * x - slope.y * y) / upright);
    const flatness = rangeOf(deviations);
    const size = largestOf(points.map(({ height }) => Math.abs(height)));
    return { flatness, deviations, slope, judged: placeInIfAny(flatness, band, size) };
  });
}

function onOneLine(points: readonly FacePoint[]): boolean {
  const { xx, yy, xy } = moments(points);
  // The determinant is the product of the spreads along and across the longest line through the places.
  return !(xx * yy - xy * xy > 1e-12 * (xx + yy) ** 2);
}
