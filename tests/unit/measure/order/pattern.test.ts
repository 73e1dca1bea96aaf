import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { recognisePattern } from '@/domain/measure/order/pattern';
import type { Position } from '@/domain/measure/order/positions';
import { valueOf } from '../../../factories/measures';
import { circle, rectangle, ring, row } from './bolts';

describe('recognisePattern', () => {
  const kind = (points: readonly Position[]) => valueOf(recognisePattern(points)).kind;

  it('knows rows, circles and rectangles at any angle', () => {
    fc.assert(fc.property(row, (points) => void expect(kind(points)).toBe('row')));
    fc.assert(fc.property(circle, (points) => void expect(kind(points)).toBe('circle')));
    fc.assert(fc.property(rectangle, (points) => void expect(kind(points)).toBe('other')));
  });

  it.each<[string, Position[], string]>([
    ['one bolt', [[3, 4]], 'row'],
    [
      'two bolts',
      [
        [0, 0],
        [5, 90],
      ],
      'row',
    ],
    [
      'a square',
      [
        [0, 0],
        [40, 0],
        [40, 40],
        [0, 40],
      ],
      'circle',
    ],
    [
      'an oblong',
      [
        [0, 0],
        [74, 0],
        [74, 40],
        [0, 40],
      ],
      'other',
    ],
    [
      'a row with one bolt a tenth aside',
      [
        [0, 0],
        [50, 10],
        [100, 0],
      ],
      'other',
    ],
    [
      'a bent row within tolerance',
      [
        [0, 0],
        [50, 1],
        [100, 0],
      ],
      'row',
    ],
    ['half a circle', ring(12).slice(0, 7), 'other'],
    ['a circle with one bolt left out', ring(12).slice(1), 'other'],
    ['a circle with a bolt in its middle', [...ring(8), [0, 0]], 'other'],
  ])('calls %s', (_name, points, expected) => {
    expect(kind(points)).toBe(expected);
  });
});
