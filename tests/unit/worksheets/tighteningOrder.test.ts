import { describe, expect, it } from 'vitest';
import { readOrder } from '@/domain/worksheets/tightening-order/readOrder';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

const bolts = (places: readonly (readonly [number, number])[]) =>
  Object.fromEntries(
    places.flatMap(([x, y], i) => [
      [`positions.${i}.x`, String(x)],
      [`positions.${i}.y`, String(y)],
    ]),
  );
const row = bolts([0, 30, 60, 90].map((x) => [x, 0] as const));
const square = bolts([
  [0, 0],
  [40, 0],
  [40, 40],
  [0, 40],
]);

describe('the tightening order', () => {
  it('works an order out and draws it', () => {
    const made = answerOf('tightening-order', { ...row, final: '20 N·m' });
    expect(textOf(made, 'order')?.metric).toBe('Bolts 2 · 3 · 1 · 4');
    expect(reasonsOf(made)).toEqual(['The bolts stand in a row: from the middle outward, side by side in turn.']);
    expect(made.charts).toMatchObject([{ kind: 'order', order: [2, 3, 1, 4], passes: [6, 12, 20] }]);
    expect(textOf(made, 'pass-1')).toEqual({ metric: '6 N·m', inch: '53 lbf·in' });
  });

  it('looks an order over', () => {
    const good = answerOf('tightening-order', { ...square, order: '1-3-2-4' });
    expect(good.verdict).toBe('none');
    expect(reasonsOf(good)[0]).toBe('Nothing is wrong with the order 1 3 2 4.');
    const bad = answerOf('tightening-order', { ...square, order: '1 2 3 4' });
    expect(bad.verdict).toBe('look');
    expect(reasonsOf(bad)[0]).toBe(
      'Bolt 1 at turn 1 is followed by bolt 2, which does not stand across the circle from it.',
    );
    expect(bad.charts.map(({ title }) => title)).toEqual(['Order worked out', 'Order that was typed']);
    const short = answerOf('tightening-order', { ...square, order: '1 3 2' });
    expect(reasonsOf(short)[0]).toBe('Bolt 4 is never tightened.');
    expect(short.charts).toHaveLength(1);
  });

  it('gives the passes of the choice', () => {
    const torques = (passes: string) =>
      answerOf('tightening-order', { ...square, final: '50', passes })
        .results.filter(({ key }) => key.startsWith('pass'))
        .map(({ value }) => value);
    expect(torques('flange')).toEqual([15, 30, 50]);
    expect(torques('two')).toEqual([35, 50]);
    expect(torques('one')).toEqual([50]);
  });

  it.each([
    [{ ...square, order: '1 3 b' }, 'order', 'The order must be bolt numbers, for example 3 8 2 7.'],
    [
      bolts([
        [0, 0],
        [10, 0],
        [0, 0],
      ]),
      'positions.2.x',
      'Bolt 3 stands at the same place as bolt 1.',
    ],
    [bolts([[0, 0]]), 'positions.1.x', 'Where the bolts stand: fill in at least 2.'],
  ])('refuses %j', (typed, field, message) => {
    expect(problemsOf('tightening-order', typed)).toEqual([{ field, message }]);
  });

  it.each<[string, number[] | null]>([
    ['3 8 2 7', [3, 8, 2, 7]],
    ['3-8-2-7', [3, 8, 2, 7]],
    ['3, 8 → 2; 7', [3, 8, 2, 7]],
    ['3 > 8', [3, 8]],
    ['12', [12]],
    ['-', null],
    ['3.5', null],
    ['3 8 x', null],
  ])('reads "%s"', (text, order) => {
    expect(readOrder(text)).toEqual(order);
  });
});
