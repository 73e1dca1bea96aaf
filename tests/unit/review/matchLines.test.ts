import { describe, expect, it } from 'vitest';
import { matchLines, type Place } from '@/components/review/matchLines';

const place = (change: Partial<Place>): Place => ({
  id: 'a',
  kind: 'same',
  moved: false,
  old: 100,
  now: 100,
  ...change,
});
const WIDTH = 84;
const line = (change: Partial<Place>) => matchLines([place(change)], WIDTH);

describe('the lines between two texts', () => {
  it('joins what did not change by a thin line on the half pixel, straight where both stand level', () => {
    expect(line({ old: 100.2, now: 99.8 })).toEqual([{ id: 'a', look: 'same', d: 'M0 100.5H84', ticks: '' }]);
  });

  it('bends where what is around it grew, and leaves and arrives level', () => {
    expect(line({ old: 306, now: 380 })[0]?.d).toBe('M0 306.5C42 306.5 42 380.5 84 380.5');
  });

  it('ticks an edited step twice about the middle', () => {
    expect(line({ kind: 'edited' })).toEqual([
      { id: 'a', look: 'edited', d: 'M0 100H84', ticks: 'M34 92v16M50 92v16' },
    ]);
  });

  it('keeps the ticks on a line that bends: symmetric about its middle', () => {
    const ticks = line({ kind: 'edited', old: 100, now: 200 })[0]?.ticks ?? '';
    const [first, second] = [...ticks.matchAll(/M(\d+) ([\d.]+)v16/g)].map(([, x, y]) => [Number(x), Number(y) + 8]);
    expect(first![0]! + second![0]!).toBe(WIDTH);
    expect(first![1]! + second![1]!).toBeCloseTo(300);
    expect(first![1]).toBeGreaterThan(100);
    expect(first![1]).toBeLessThan(150);
  });

  it('slants to where a step moved, straight from edge to edge', () => {
    expect(line({ moved: true, old: 50, now: 250 })).toEqual([
      { id: 'a', look: 'moved', d: 'M0 50L84 250', ticks: '' },
    ]);
    const both = line({ kind: 'edited', moved: true, old: 50, now: 250 });
    expect(both).toMatchObject([{ look: 'edited', d: 'M0 50L84 250' }]);
    expect(both[0]?.ticks).not.toBe('');
  });

  it('starts a new step from nowhere, and lets a removed one end in nowhere', () => {
    expect(line({ kind: 'added', old: null, now: 300 })).toMatchObject([{ look: 'added', d: 'M84 300H59' }]);
    expect(line({ kind: 'removed', old: 300, now: null })).toMatchObject([{ look: 'removed', d: 'M0 300H25' }]);
  });

  it('draws nothing for what is folded away on both sides', () => {
    expect(line({ old: null, now: null })).toEqual([]);
  });
});
