import { describe, expect, it } from 'vitest';
import { checkOrder } from '@/domain/measure/order/check';
import { makeOrder } from '@/domain/measure/order/make';
import { PASS_SHARES, passTorques } from '@/domain/measure/order/passes';
import type { Position } from '@/domain/measure/order/positions';
import { convert } from '@/domain/measure/convert';
import { valueOf } from '../factories/measures';

/** Bolts at the hours of a clock of `n` hours, bolt 1 at the top, numbered clockwise. */
const clock = (n: number): Position[] =>
  Array.from({ length: n }, (_, i) => [100 * Math.sin((2 * Math.PI * i) / n), -100 * Math.cos((2 * Math.PI * i) / n)]);

const PUBLISHED: readonly (readonly [source: string, order: number[]])[] = [
  ['US Army TB 9-3950-253-13&P WP 0061, clock positions (seen)', [1, 7, 4, 10, 2, 8, 6, 12, 5, 11, 9, 3]],
  ['flange order in the style of ASME PCC-1, 12 bolts (quoted)', [1, 7, 4, 10, 2, 8, 5, 11, 3, 9, 6, 12]],
  ['ASME PCC-1 cross pattern, 4 bolts (from memory)', [1, 3, 2, 4]],
  ['ASME PCC-1 cross pattern, 8 bolts (from memory)', [1, 5, 3, 7, 2, 6, 4, 8]],
  ['ASME PCC-1 cross pattern, 16 bolts (from memory)', [1, 9, 5, 13, 3, 11, 7, 15, 2, 10, 6, 14, 4, 12, 8, 16]],
  [
    'ASME PCC-1 cross pattern, 20 bolts (from memory)',
    [1, 11, 6, 16, 3, 13, 8, 18, 5, 15, 10, 20, 2, 12, 7, 17, 4, 14, 9, 19],
  ],
  [
    'ASME PCC-1 cross pattern, 24 bolts (from memory)',
    [1, 13, 7, 19, 4, 16, 10, 22, 2, 14, 8, 20, 5, 17, 11, 23, 3, 15, 9, 21, 6, 18, 12, 24],
  ],
];

describe('published circle orders', () => {
  it.each(PUBLISHED)('%s is accepted', (_source, order) => {
    expect(valueOf(checkOrder(clock(order.length), order))).toEqual({ kind: 'circle', findings: [] });
  });

  it('has the label list of the Army figure read the other way as the same order', () => {
    // Labels clockwise from 12 o'clock: 1 5 12 3 9 7 2 6 11 4 10 8 (seen).
    const labels = [1, 5, 12, 3, 9, 7, 2, 6, 11, 4, 10, 8];
    expect(labels.map((_, turn) => labels.indexOf(turn + 1) + 1)).toEqual(PUBLISHED[0]![1]);
  });

  it('halving: a pair across, then the angle halved (quoted): 0 and 180, 90 and 270, 45 and 225, 135 and 315', () => {
    const degrees = valueOf(makeOrder(clock(8))).order.map((bolt) => (bolt - 1) * 45);
    expect(degrees).toEqual([0, 180, 90, 270, 45, 225, 135, 315]);
  });
});

describe('passes', () => {
  it('30, 60, 100 % (quoted, common on flanges)', () => {
    expect(valueOf(passTorques(40)).map(({ torque }) => torque)).toEqual([12, 24, 40]);
  });

  it('70 %, then the whole, above 30 lbf·ft, printed as 41 N·m (TB 9-3950-253-13&P, seen)', () => {
    const least = convert(30, 'lbf·ft', 'N·m');
    expect(least.ok && Math.round(least.value)).toBe(41);
    expect(valueOf(passTorques(50, PASS_SHARES.two)).map(({ torque }) => torque)).toEqual([35, 50]);
  });
});
