import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { passTorques } from '@/domain/measure/order/passes';
import { valueOf } from '../../../factories/measures';
import { expectRefused } from '../sweep';

describe('passTorques', () => {
  it('rises to exactly the final torque', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 2000, noNaN: true }), (final) => {
        const torques = valueOf(passTorques(final)).map(({ torque }) => torque);
        expect(torques).toEqual([...torques].sort((a, b) => a - b));
        expect(torques.at(-1)).toBe(final);
      }),
    );
  });

  it.each<[number, number[], string]>([
    [0, [1], 'final'],
    [NaN, [1], 'final'],
    [10, [], 'shares'],
    [10, [0.5], 'shares'],
    [10, [0.6, 0.3, 1], 'shares.1'],
    [10, [0, 1], 'shares.0'],
    [10, [0.5, 1.2], 'shares.1'],
    [10, [NaN, 1], 'shares.0'],
  ])('refuses %d in shares %j at %s', (final, shares, field) => {
    expectRefused(passTorques(final, shares), field);
  });
});
