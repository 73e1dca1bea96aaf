import { describe, it } from 'vitest';
import { checkOrder } from '@/domain/measure/order/check';
import { makeOrder } from '@/domain/measure/order/make';
import { passTorques } from '@/domain/measure/order/passes';
import { recognisePattern } from '@/domain/measure/order/pattern';
import type { Position } from '@/domain/measure/order/positions';
import { EXTREMES, NO_NUMBERS, expectRefused, expectSound } from '../sweep';
import { ring } from './bolts';

describe('hostile positions', () => {
  it('never make it throw, and never come out as what is no number', () => {
    const fields = /^(positions(\.\d+(\.[01])?)?|order(\.\d+)?|final|shares(\.\d+)?)$/;
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) {
      const points = [
        [0, 0],
        [bad, 10],
        [20, bad],
      ] as unknown as Position[];
      expectSound(recognisePattern(points), fields);
      expectSound(makeOrder(points), fields);
      expectSound(checkOrder(ring(4), [1, bad, 2, 3]), fields);
      expectSound(checkOrder(ring(4), bad as unknown as number[]), fields);
      expectSound(makeOrder(bad as unknown as Position[]), fields);
      expectSound(makeOrder([bad] as unknown as Position[]), fields);
      expectSound(passTorques(bad), fields);
      expectSound(passTorques(10, bad as unknown as number[]), fields);
    }
    expectRefused(makeOrder([]), 'positions');
    expectRefused(makeOrder(ring(201)), 'positions');
    expectRefused(
      makeOrder([
        [0, 0],
        [NaN, 0],
      ]),
      'positions.1.0',
    );
    expectRefused(
      makeOrder([
        [0, 0],
        [0, 1e308],
      ]),
      'positions.1.1',
    );
    expectRefused(
      makeOrder([
        [5, 5],
        [0, 0],
        [5, 5],
      ]),
      'positions.2',
    );
    expectRefused(checkOrder(ring(4), []), 'order');
    expectRefused(checkOrder(ring(4), [1, NaN]), 'order.1');
  });
});
