import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkOrder } from '@/domain/measure/order/check';
import { RING_TOLERANCE, makeOrder } from '@/domain/measure/order/make';
import { type Position, distance, middleOf } from '@/domain/measure/order/positions';
import { valueOf } from '../../../factories/measures';
import { anything, ring } from './bolts';

describe('makeOrder', () => {
  it('visits every bolt once, whatever the shape', () => {
    fc.assert(
      fc.property(anything, (points) => {
        const { order } = valueOf(makeOrder(points));
        expect([...order].sort((a, b) => a - b)).toEqual(points.map((_, i) => i + 1));
      }),
    );
  });

  it('makes nothing that the check finds fault with', () => {
    fc.assert(
      fc.property(anything, (points) => {
        expect(valueOf(checkOrder(points, valueOf(makeOrder(points)).order)).findings).toEqual([]);
      }),
    );
  });

  it('goes outward from the middle in rows and in all other shapes but circles', () => {
    fc.assert(
      fc.property(anything, (points) => {
        const made = valueOf(makeOrder(points));
        if (made.kind === 'circle') return;
        const ends = made.kind === 'row' ? points : [];
        const middle = middleOf(ends.length > 0 ? ends : points);
        const from = made.order.map((bolt) => distance(points[bolt - 1]!, middle));
        const slack = (RING_TOLERANCE + 1e-6) * Math.max(...from);
        from.forEach((here, i) => expect(here).toBeGreaterThanOrEqual(Math.max(...from.slice(0, i + 1)) - slack));
      }),
    );
  });

  it('answers each bolt of an even circle with the one opposite, and of an odd one with a nearest to opposite', () => {
    for (let n = 3; n <= 40; n += 1) {
      const points = ring(n);
      const { order, kind } = valueOf(makeOrder(points));
      expect(kind).toBe('circle');
      for (let turn = 0; turn + 1 < n; turn += 2) {
        const [one, other] = [points[order[turn]! - 1]!, points[order[turn + 1]! - 1]!];
        // Across an even circle the two add up to nothing; in an odd one half a step is left.
        const left = Math.hypot(one[0] + other[0], one[1] + other[1]);
        expect(left).toBeLessThan(n % 2 === 0 ? 1e-9 : 2 * 80 * Math.sin(Math.PI / (2 * n)) + 1e-9);
      }
    }
  });

  it('takes the second pair a quarter turn from the first where there is one', () => {
    for (const n of [4, 8, 12, 16, 20, 24]) {
      const { order } = valueOf(makeOrder(ring(n)));
      expect(order.slice(0, 4)).toEqual([1, 1 + n / 2, 1 + n / 4, 1 + (3 * n) / 4]);
    }
  });

  it.each<[string, Position[], number[]]>([
    ['five bolts round', ring(5), [1, 3, 5, 2, 4]],
    ['seven bolts round', ring(7), [1, 4, 6, 2, 7, 3, 5]],
    ['a row of six', [0, 1, 2, 3, 4, 5].map((i): Position => [i * 30, 0]), [3, 4, 2, 5, 1, 6]],
    [
      'four at the corners of an oblong',
      [
        [0, 0],
        [74, 0],
        [74, 40],
        [0, 40],
      ],
      [1, 3, 4, 2],
    ],
  ])('%s', (_name, points, order) => {
    expect(valueOf(makeOrder(points)).order).toEqual(order);
  });
});
