import { type Worked, work } from '../worked';
import { type Position, distance, middleOf, positionProblems } from './positions';

/** The shape that bolts make, with what an order needs of it. Bolts are counted from 0 here. */
export type Pattern =
  /** All on one straight line; `along` is each bolt's place on it, the middle of the row being 0. */
  | { kind: 'row'; along: number[] }
  /** Evenly round one circle; `places` counts each bolt's place clockwise as seen, bolt 1 standing at 0. */
  | { kind: 'circle'; centre: Position; radius: number; places: number[] }
  /** Anything else: a rectangle, a cover, a circle with bolts left out. */
  | { kind: 'other'; centre: Position };

/** How far a bolt may stand off the line or the circle, as a share of the row's length or the radius. */
const SHAPE_TOLERANCE = 0.02;

/** How far a bolt may stand round from its even place, as a share of one step. */
const STEP_TOLERANCE = 0.1;

/** The row that the bolts stand in, or null: the line goes through the two that are farthest apart. */
function rowOf(positions: readonly Position[]): Pattern | null {
  if (positions.length === 1) return { kind: 'row', along: [0] };
  let ends: readonly [Position, Position, number] | null = null;
  for (const [i, a] of positions.entries())
    for (const b of positions.slice(i + 1)) if (distance(a, b) > (ends?.[2] ?? 0)) ends = [a, b, distance(a, b)];
  if (!ends) return null;
  const [[ax, ay], [bx, by], length] = ends;
  const [ux, uy] = [(bx - ax) / length, (by - ay) / length];
  const isOff = ([x, y]: Position) => Math.abs((x - ax) * uy - (y - ay) * ux) > SHAPE_TOLERANCE * length;
  if (positions.some(isOff)) return null;
  return { kind: 'row', along: positions.map(([x, y]) => (x - ax) * ux + (y - ay) * uy - length / 2) };
}

/** Centre of the circle that lies nearest to the bolts, by least squares of the squared radii (Kåsa); null on a line. */
function centreOf(positions: readonly Position[]): Position | null {
  const n = positions.length;
  const mean = [0, 1].map((axis) => positions.reduce((sum, p) => sum + (p[axis] ?? 0), 0) / n);
  const sum = (of: (u: number, v: number) => number) =>
    positions.reduce((total, [x, y]) => total + of(x - (mean[0] ?? 0), y - (mean[1] ?? 0)), 0);
  const [uu, uv, vv] = [sum((u) => u * u), sum((u, v) => u * v), sum((_, v) => v * v)];
  const [p, q] = [sum((u, v) => (u * (u * u + v * v)) / 2), sum((u, v) => (v * (u * u + v * v)) / 2)];
  const determinant = uu * vv - uv * uv;
  if (!(determinant > 1e-9 * uu * vv)) return null;
  return [(mean[0] ?? 0) + (p * vv - q * uv) / determinant, (mean[1] ?? 0) + (q * uu - p * uv) / determinant];
}

/** Each bolt's place when the circle is divided evenly, or null where the bolts do not stand evenly. */
function placesOf(angles: readonly number[]): number[] | null {
  const step = 360 / angles.length;
  const turned = angles.map((angle) => (angle - (angles[0] ?? 0) + 360) % 360);
  const places = turned.map((angle) => Math.round(angle / step) % angles.length);
  if (new Set(places).size < angles.length) return null;
  const off = turned.map((angle, i) => {
    const miss = angle - (places[i] ?? 0) * step;
    return miss > 180 ? miss - 360 : miss;
  });
  // Bolt 1 need not stand at its even place either.
  const mean = off.reduce((sum, miss) => sum + miss, 0) / off.length;
  return off.some((miss) => Math.abs(miss - mean) > STEP_TOLERANCE * step) ? null : places;
}

/** The circle that the bolts stand on, evenly or not; null where they stand on none. Any three that make no row do. */
export function circleThrough(positions: readonly Position[]): { centre: Position; radius: number } | null {
  const centre = positions.length < 3 ? null : centreOf(positions);
  if (!centre) return null;
  const radii = positions.map((position) => distance(position, centre));
  const radius = radii.reduce((sum, r) => sum + r, 0) / radii.length;
  return radii.some((r) => Math.abs(r - radius) > SHAPE_TOLERANCE * radius) ? null : { centre, radius };
}

/** The circle that the bolts stand round evenly, or null. */
function circleOf(positions: readonly Position[]): Pattern | null {
  const circle = circleThrough(positions);
  if (!circle) return null;
  const { centre, radius } = circle;
  const places = placesOf(positions.map(([x, y]) => (Math.atan2(y - centre[1], x - centre[0]) * 180) / Math.PI));
  return places && { kind: 'circle', centre, radius, places };
}

/**
 * Tells from where the bolts stand whether they make a row, a circle or neither.
 *
 * @param positions in mm
 * @returns problems name `positions`, `positions.n`, `positions.n.0` (x), `positions.n.1` (y)
 */
export function recognisePattern(positions: readonly Position[]): Worked<Pattern> {
  return work(
    positionProblems(positions),
    'positions',
    (): Pattern => rowOf(positions) ?? circleOf(positions) ?? { kind: 'other', centre: middleOf(positions) },
  );
}
