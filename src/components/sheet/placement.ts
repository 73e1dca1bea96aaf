import { circleThrough } from '@/domain/measure/order/pattern';

/** Where each bolt stands in the drawing, in the drawing's own units. */
export interface Placement {
  width: number;
  height: number;
  /** Radius of a bolt's circle. */
  radius: number;
  /** What the bolts hold down, as far as their places tell. */
  outline: 'rectangle' | 'circle';
  bolts: { x: number; y: number }[];
}

const WIDTH = 244;
const TALLEST = 300;
const LARGEST = 11.5;
const SMALLEST = 8;

type Point = readonly [number, number];

const gap = ([ax, ay]: Point, [bx, by]: Point) => Math.hypot(ax - bx, ay - by);

/** Fewer than five stand on a circle too where they hold down something square. */
const onCircle = (points: readonly Point[]) => points.length >= 5 && circleThrough(points) !== null;

/**
 * Fits positions in mm into a drawing `WIDTH` wide. The scale is the same both ways, so that the drawing keeps the
 * part's shape; circles shrink where bolts stand close together.
 */
export function place(positions: readonly Point[]): Placement {
  const left = Math.min(...positions.map(([x]) => x));
  const top = Math.min(...positions.map(([, y]) => y));
  const wide = Math.max(...positions.map(([x]) => x)) - left;
  const high = Math.max(...positions.map(([, y]) => y)) - top;
  const circle = onCircle(positions);
  // Room between the outermost bolts and the edge of the drawing: their own circle, and the outline round it.
  const edge = LARGEST + (circle ? 9 : 12);
  const scale = Math.min((WIDTH - 2 * edge) / (wide || 1), (TALLEST - 2 * edge) / (high || 1));
  let closest = Infinity;
  positions.forEach((a, i) => positions.slice(i + 1).forEach((b) => (closest = Math.min(closest, gap(a, b)))));
  const radius = Math.max(SMALLEST, Math.min(LARGEST, (closest * scale) / 2 - 1.5));
  const inset = (WIDTH - wide * scale) / 2;
  return {
    width: WIDTH,
    height: Math.round(high * scale + 2 * edge),
    radius,
    outline: circle ? 'circle' : 'rectangle',
    bolts: positions.map(([x, y]) => ({ x: (x - left) * scale + inset, y: (y - top) * scale + edge })),
  };
}
