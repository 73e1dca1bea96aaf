import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalsOf, roundTo } from '@/domain/measure/round';

/** Exact model on decimal digits: value and step are whole numbers of 10^-6. */
function model(value: bigint, step: bigint): bigint {
  const size = value < 0n ? -value : value;
  const whole = (2n * size + step) / (2n * step);
  return (value < 0n ? -1n : 1n) * whole * step;
}

describe('roundTo', () => {
  it('agrees with exact decimal arithmetic, halves included', () => {
    const steps = [1, 5, 10, 50, 100, 500, 1000, 2000, 5000, 10_000, 100_000, 500_000, 1_000_000, 5_000_000];
    fc.assert(
      fc.property(fc.integer({ min: -2e9, max: 2e9 }), fc.constantFrom(...steps), (value, step) => {
        expect(roundTo(value / 1e6, step / 1e6)).toBe(Number(model(BigInt(value), BigInt(step))) / 1e6 + 0);
      }),
      { numRuns: 5000 },
    );
  });

  it.each([
    [1.005, 0.01, 1.01],
    [-1.005, 0.01, -1.01],
    [2.5, 1, 3],
    [-2.5, 1, -3],
    [0.3, 0.1, 0.3],
    [44.2537, 0.5, 44.5],
    [7.4, 5, 5],
    [-0.04, 0.1, 0],
    [1e-9, 1e-7, 0],
  ])('%d to %d is %d', (value, step, want) => {
    expect(roundTo(value, step)).toBe(want);
  });

  it('leaves alone what is rounded already', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        fc.constantFrom(0.001, 0.01, 0.05, 0.5, 1, 5),
        (v, step) => {
          const once = roundTo(v, step);
          expect(roundTo(once, step)).toBe(once);
          expect(Math.abs(once - v)).toBeLessThanOrEqual(step / 2 + 1e-9);
        },
      ),
    );
  });

  it('refuses what cannot be rounded', () => {
    expect(() => roundTo(NaN, 1)).toThrow('The value to round must be a number.');
    for (const step of [0, -1, NaN, Infinity])
      expect(() => roundTo(1, step)).toThrow('The resolution to round to must be more than zero.');
  });

  it('counts the places of a step', () => {
    expect([0.05, 0.1, 1, 5, 1e-7, 2.5e-7, 1e21].map(decimalsOf)).toEqual([2, 1, 0, 0, 7, 8, 0]);
  });
});
