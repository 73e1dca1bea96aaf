import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { apart } from '@/components/worksheets/charts/apart';

describe('labels that crowd', () => {
  it.each([
    [
      [10, 100],
      [10, 100],
    ],
    [
      [60, 64, 68],
      [49, 64, 79],
    ],
    [
      [68, 60, 64],
      [79, 49, 64],
    ],
    [
      [10, 10],
      [2.5, 17.5],
    ],
    [[], []],
  ])('%j stand at %j', (wanted, placed) => {
    expect(apart(wanted, 15)).toEqual(placed);
  });

  it('keep their order and their distance, and do not wander where there is room', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 200 }), { maxLength: 6 }), (wanted) => {
        const placed = apart(wanted, 15);
        const sorted = wanted.map((at, i) => ({ at, placed: placed[i]! })).sort((a, b) => a.placed - b.placed);
        for (let i = 1; i < sorted.length; i++) {
          expect(sorted[i]!.placed - sorted[i - 1]!.placed).toBeGreaterThanOrEqual(15 - 1e-9);
          expect(sorted[i]!.at).toBeGreaterThanOrEqual(sorted[i - 1]!.at);
        }
        const far = sorted.every(({ at }, i) => i === 0 || at - sorted[i - 1]!.at >= 15);
        if (far) expect(placed).toEqual(wanted);
        const sum = (list: number[]) => list.reduce((total, one) => total + one, 0);
        expect(sum(placed)).toBeCloseTo(sum(wanted), 6);
      }),
    );
  });
});
