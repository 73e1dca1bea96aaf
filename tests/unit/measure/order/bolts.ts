import fc from 'fast-check';
import type { Position } from '@/domain/measure/order/positions';

/** Bolt positions for the tests of tightening orders, in mm. */
const turned = (points: readonly Position[], degrees: number): Position[] => {
  const [c, s] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
  return points.map(([x, y]) => [x * c - y * s + 300, x * s + y * c - 200]);
};
export const ring = (n: number, radius = 80): Position[] =>
  Array.from({ length: n }, (_, i) => [
    radius * Math.sin((2 * Math.PI * i) / n),
    -radius * Math.cos((2 * Math.PI * i) / n),
  ]);
const degrees = fc.integer({ min: 0, max: 359 });
const mm = fc.integer({ min: -1000, max: 1000 });

/** Rows, evenly spaced or not, at any angle, in any numbering. */
export const row = fc
  .tuple(fc.uniqueArray(fc.integer({ min: 0, max: 60 }), { minLength: 2, maxLength: 20 }), degrees)
  .map(([steps, angle]) =>
    turned(
      steps.map((step): Position => [step * 12, 0]),
      angle,
    ),
  );
/** Circles, each bolt up to 4 % of a step off its place and 1 % off the radius, in any numbering. */
export const circle = fc
  .integer({ min: 3, max: 30 })
  .chain((n) =>
    fc.tuple(
      fc.shuffledSubarray(
        Array.from({ length: n }, (_, i) => i),
        { minLength: n, maxLength: n },
      ),
      fc.array(fc.double({ min: -0.04, max: 0.04, noNaN: true }), { minLength: n, maxLength: n }),
      degrees,
    ),
  )
  .map(([places, off, angle]) => {
    const n = places.length;
    const points = places.map((place, i): Position => {
      const at = (2 * Math.PI * (place + (off[i] ?? 0))) / n;
      const radius = 80 * (1 + 0.25 * (off[i] ?? 0));
      return [radius * Math.sin(at), -radius * Math.cos(at)];
    });
    return turned(points, angle);
  });
export const rectangle = fc
  .tuple(fc.integer({ min: 2, max: 3 }), fc.integer({ min: 3, max: 9 }), degrees)
  .map(([rows, columns, angle]) => {
    const points = Array.from({ length: rows * columns }, (_, i): Position => [
      (i % columns) * 90,
      Math.floor(i / columns) * 70,
    ]);
    return turned(points, angle);
  });
const scatter = fc.uniqueArray(fc.tuple(mm, mm), { minLength: 1, maxLength: 40, selector: String });
export const anything = fc.oneof(row, circle, rectangle, scatter);
