import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { place } from '@/components/sheet/placement';

const point = fc.tuple(fc.integer({ min: -500, max: 500 }), fc.integer({ min: -500, max: 500 }));
const points = fc.uniqueArray(point, { minLength: 1, maxLength: 30, selector: ([x, y]) => `${x},${y}` });

describe('placing bolts in a drawing', () => {
  it('keeps every bolt, circle and all, inside the drawing', () => {
    fc.assert(
      fc.property(points, (positions) => {
        const { width, height, radius, bolts } = place(positions);
        expect(bolts).toHaveLength(positions.length);
        for (const { x, y } of bolts) {
          expect(x - radius).toBeGreaterThanOrEqual(0);
          expect(x + radius).toBeLessThanOrEqual(width);
          expect(y - radius).toBeGreaterThanOrEqual(0);
          expect(y + radius).toBeLessThanOrEqual(height + 1);
        }
      }),
    );
  });

  it('keeps the shape: distances all shrink or grow alike', () => {
    fc.assert(
      fc.property(
        points.filter((all) => all.length > 2),
        (positions) => {
          const { bolts } = place(positions);
          const far = (a: number, b: number, at: readonly (readonly [number, number])[]) =>
            Math.hypot((at[a]?.[0] ?? 0) - (at[b]?.[0] ?? 0), (at[a]?.[1] ?? 0) - (at[b]?.[1] ?? 0));
          const drawn = bolts.map(({ x, y }) => [x, y] as const);
          const scale = far(0, 1, drawn) / far(0, 1, positions);
          expect(far(1, 2, drawn)).toBeCloseTo(scale * far(1, 2, positions), 6);
        },
      ),
    );
  });

  it('draws a round part for bolts on a circle, and a rectangle for a pattern of rows', () => {
    const circle = [0, 1, 2, 3, 4, 5].map(
      (i) => [40 * Math.cos((i * Math.PI) / 3), 40 * Math.sin((i * Math.PI) / 3)] as const,
    );
    expect(place(circle).outline).toBe('circle');
    // The corners of a rectangle lie on one circle too.
    expect(
      place([
        [0, 0],
        [200, 0],
        [200, 120],
        [0, 120],
      ]).outline,
    ).toBe('rectangle');
  });

  it('shrinks the circles where bolts stand close, so that their numbers stay apart', () => {
    const row = Array.from({ length: 12 }, (_, i) => [i * 50, 0] as const);
    const { bolts, radius } = place(row);
    expect((bolts[1]?.x ?? 0) - (bolts[0]?.x ?? 0)).toBeGreaterThan(2 * radius);
    expect(radius).toBeLessThan(
      place([
        [0, 0],
        [100, 0],
      ]).radius,
    );
  });
});
