import { readFileSync, readdirSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkOrder } from '@/domain/measure/order/check';
import { makeOrder } from '@/domain/measure/order/make';
import type { Position } from '@/domain/measure/order/positions';
import { parseProcedure } from '@/domain/procedure/parse';
import { valueOf } from '../../../factories/measures';
import { anything, ring } from './bolts';

const shipped = readdirSync('content/procedures').flatMap((name) => {
  const parsed = parseProcedure(readFileSync(`content/procedures/${name}`, 'utf8'));
  return parsed.ok
    ? parsed.procedure.frontmatter.torques.flatMap(({ key, positions, order }) =>
        positions && order ? [{ at: `${name} ${key}`, positions, order }] : [],
      )
    : [];
});

describe('checkOrder', () => {
  const findings = (points: readonly Position[], order: readonly number[]) =>
    valueOf(checkOrder(points, order)).findings;

  it('finds nothing in the orders that the book ships', () => {
    expect(shipped.length).toBeGreaterThan(12);
    for (const { at, positions, order } of shipped) expect(findings(positions, order), at).toEqual([]);
  });

  it.each<[string, Position[], number[], string[]]>([
    ['a bolt forgotten', ring(4), [1, 3, 2], ['Bolt 4 is never tightened.']],
    ['a bolt twice', ring(4), [1, 3, 2, 4, 2], ['Bolt 2 is tightened more than once.']],
    [
      'bolts that are not there',
      ring(4),
      [1, 3, 2, 0, 9],
      ['Bolt 4 is never tightened.', 'There is no bolt 0, 9; there are 4.'],
    ],
    [
      'a row from one end',
      [0, 1, 2, 3].map((i): Position => [i * 30, 0]),
      [1, 2, 3, 4],
      ['Bolt 2 comes at turn 2, after bolts that lie farther out; a row is tightened from its middle outward.'],
    ],
    [
      'round and round',
      ring(4),
      [1, 2, 3, 4],
      [
        'Bolt 1 at turn 1 is followed by bolt 2, which does not stand across the circle from it.',
        'Bolt 3 at turn 3 is followed by bolt 4, which does not stand across the circle from it.',
      ],
    ],
    [
      'pairs that sweep round',
      ring(8),
      [1, 5, 2, 6, 3, 7, 4, 8],
      ['Bolt 2 at turn 3 stands too near the first two; the second pair goes at a quarter turn to the first.'],
    ],
    [
      'a head from one end',
      [0, 1, 2, 3, 4, 5].map((i): Position => [(i % 3) * 90, i < 3 ? 0 : 90]),
      [1, 4, 2, 5, 3, 6],
      [
        'Bolt 2 comes at turn 3, after bolts that lie farther out. No rule is published for this shape; from the middle outward is usual.',
      ],
    ],
  ])('names %s', (_name, points, order, messages) => {
    expect(findings(points, order).map(({ message }) => message)).toEqual(messages);
  });

  it('takes an uneven row by rank as well as by distance', () => {
    const points = [0, 10, 20, 30, 200].map((x): Position => [x, 0]);
    expect(findings(points, [4, 3, 2, 1, 5])).toEqual([]);
    expect(findings(points, [3, 2, 4, 1, 5])).toEqual([]);
    expect(findings(points, [5, 1, 2, 3, 4])).toHaveLength(1);
  });

  it('finds fault with almost every shuffled circle of eight', () => {
    const order = fc.shuffledSubarray([1, 2, 3, 4, 5, 6, 7, 8], { minLength: 8, maxLength: 8 });
    const sample = fc.sample(order, 400);
    const good = sample.filter((tried) => findings(ring(8), tried).length === 0);
    // 8·1 · 2·1 · 4·1 · 2·1 of 8! orders are stars: one in 315.
    expect(good.length).toBeLessThan(20);
  });

  it('names each fault that was put in', () => {
    fc.assert(
      fc.property(anything, fc.nat(), (points, at) => {
        fc.pre(points.length > 1);
        const { order } = valueOf(makeOrder(points));
        const i = at % order.length;
        const gone = order[i]!;
        expect(findings(points, order.toSpliced(i, 1))).toMatchObject([{ name: 'missing', bolts: [gone] }]);
        expect(findings(points, [...order, gone])).toMatchObject([{ name: 'twice', bolts: [gone] }]);
        expect(findings(points, [...order, 999])).toMatchObject([{ name: 'no such bolt', bolts: [999] }]);
      }),
    );
  });
});
