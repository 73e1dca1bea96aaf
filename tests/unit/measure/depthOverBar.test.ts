import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { depthAcrossJoint, depthOverBar, type BarReading, type DepthOverBar } from '@/domain/measure/depthOverBar';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, valueOf } from '../../factories/measures';

const bar = 25.4 * MM;
const over = (reading: number, more: Partial<DepthOverBar> = {}): DepthOverBar => ({
  reading: reading * MM,
  bar,
  readFrom: 'bar-top',
  direction: 'below',
  ...more,
});
const band = (min: number, max: number) => ({ min: min * MM, max: max * MM });
const mm = (value: number) => value / MM;

describe('depth over a bar', () => {
  it('takes the bar off a reading from its top', () => {
    const found = valueOf(depthOverBar(over(53.4, { band: band(24, 32) })));
    expect(mm(found.distance)).toBeCloseTo(28, 9);
    expect(found.judged).toEqual({ at: 'in', by: 0 });
    expect(mm(found.mistaken.distance)).toBeCloseTo(53.4, 9);
    expect(found.onlyMistakePasses).toBe(false);
  });

  it('warns when only the forgotten bar would pass', () => {
    const found = valueOf(depthOverBar(over(28, { band: band(24, 32) })));
    expect(mm(found.distance)).toBeCloseTo(2.6, 9);
    expect(found).toMatchObject({
      judged: { at: 'under', by: expect.closeTo(21.4 * MM, 12) },
      mistaken: { judged: { at: 'in' } },
      onlyMistakePasses: true,
    });
  });

  it('warns when only a bar that was taken off twice would pass', () => {
    const found = valueOf(depthOverBar(over(53.4, { readFrom: 'face', band: band(24, 32) })));
    expect(mm(found.distance)).toBeCloseTo(53.4, 9);
    expect(mm(found.mistaken.distance)).toBeCloseTo(28, 9);
    expect(found.onlyMistakePasses).toBe(true);
  });

  it('counts the bar with a plus for a part that stands proud: above = bar − reading', () => {
    const proud = { direction: 'above' as const };
    const found = valueOf(depthOverBar(over(25.15, { ...proud, band: band(0.2, 0.3) })));
    expect(mm(found.distance)).toBeCloseTo(0.25, 9);
    expect(mm(found.below)).toBeCloseTo(-0.25, 9);
    expect(found.judged?.at).toBe('in');
    expect(mm(valueOf(depthOverBar(over(-0.25, { ...proud, readFrom: 'face' }))).distance)).toBeCloseTo(0.25, 9);
  });

  it('takes off what the gauge shows on its master', () => {
    const at = (zeroOffset: number) => mm(valueOf(depthOverBar(over(53.4, { zeroOffset: zeroOffset * MM }))).distance);
    expect(at(0.02)).toBeCloseTo(27.98, 9);
    expect(at(-0.02)).toBeCloseTo(28.02, 9);
  });

  it('gives a part flush with the face as 0, either way', () => {
    for (const direction of ['below', 'above'] as const) {
      const { distance, below } = valueOf(depthOverBar(over(25.4, { direction })));
      expect(Object.is(distance, 0) && Object.is(below, 0)).toBe(true);
    }
  });

  it('has a mistake that is always exactly one bar away', () => {
    const readings = fc.tuple(
      between(0, 0.2),
      between(1e-3, 0.1),
      fc.constantFrom('bar-top', 'face'),
      between(-1e-3, 1e-3),
    );
    fc.assert(
      fc.property(readings, fc.constantFrom('below', 'above'), ([reading, thick, readFrom, zeroOffset], direction) => {
        const input = { reading, bar: thick, readFrom, zeroOffset, direction } as DepthOverBar;
        const found = valueOf(depthOverBar(input));
        expect(Math.abs(Math.abs(found.mistaken.distance - found.distance) - thick)).toBeLessThan(1e-12);
        // The reading can be had back from the answer.
        const back = found.below + zeroOffset + (readFrom === 'bar-top' ? thick : 0);
        expect(Math.abs(back - reading)).toBeLessThan(1e-12);
        const other = valueOf(depthOverBar({ ...input, direction: direction === 'below' ? 'above' : 'below' }));
        expect(other.distance).toBeCloseTo(-found.distance, 12);
      }),
    );
  });

  it('never judges a deeper reading to lie higher', () => {
    const rank = { under: -1, in: 0, over: 1 };
    fc.assert(
      fc.property(between(0, 0.1), between(0, 0.05), (reading, more) => {
        const at = (value: number) => {
          const input = over(0, { reading: value, band: band(24, 32) });
          return rank[valueOf(depthOverBar(input)).judged!.at];
        };
        expect(at(reading + more)).toBeGreaterThanOrEqual(at(reading));
      }),
    );
  });

  it.each<[Partial<DepthOverBar>, string, string]>([
    [{ bar: 0 }, 'bar', 'The thickness of the bar must be more than zero.'],
    [{ bar: -bar }, 'bar', 'The thickness of the bar must be more than zero.'],
    [{ reading: -0.001 }, 'reading', 'The reading cannot be less than zero.'],
    [{ reading: 53.4 }, 'reading', 'The reading must be 10 m or less.'],
    [{ readFrom: '' as 'face' }, 'readFrom', 'Say whether the gauge reads from the top of the bar or from the face.'],
    [{ direction: 'toString' as 'below' }, 'direction', 'Say whether the distance is counted below or above the face.'],
  ])('refuses %j', (more, field, message) => {
    expect(depthOverBar(over(53.4, more))).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('withstands odd input', () => {
    sweep(depthOverBar, over(53.4, { zeroOffset: 0.01 * MM, band: band(24, 32) }));
    sweep(depthOverBar, over(53.4, { readFrom: 'face', direction: 'above' }));
  });
});

describe('depth across a joint', () => {
  const first: BarReading = { reading: 38.4 * MM, bar, readFrom: 'bar-top' };
  const second: BarReading = { reading: 53.4 * MM, bar, readFrom: 'bar-top' };

  it('takes two bars off two readings', () => {
    const found = valueOf(depthAcrossJoint({ first, second, band: band(36, 46) }));
    expect(found.depths.map(mm)).toEqual([expect.closeTo(13, 9), expect.closeTo(28, 9)]);
    expect(mm(found.distance)).toBeCloseTo(41, 9);
    expect(found.judged?.at).toBe('in');
    expect(found.mistaken.map((one) => mm(one.distance))).toEqual([
      expect.closeTo(66.4, 9),
      expect.closeTo(66.4, 9),
      expect.closeTo(91.8, 9),
    ]);
    expect(found.onlyMistakePasses).toBe(false);
  });

  it('warns when one bar left in would make a dangerous engine look safe', () => {
    const near = { ...second, reading: 28 * MM };
    const found = valueOf(depthAcrossJoint({ first, second: near, band: band(36, 46) }));
    expect(mm(found.distance)).toBeCloseTo(15.6, 9);
    expect(found).toMatchObject({ judged: { at: 'under' }, onlyMistakePasses: true });
  });

  it('does not warn where the truth passes too, or where the mistake fails as well', () => {
    const wide = valueOf(depthAcrossJoint({ first, second, band: band(36, 100) }));
    expect(wide).toMatchObject({ judged: { at: 'in' }, onlyMistakePasses: false });
    const far = valueOf(depthAcrossJoint({ first, second, band: band(1, 2) }));
    expect(far).toMatchObject({ judged: { at: 'over' }, onlyMistakePasses: false });
    expect(valueOf(depthAcrossJoint({ first, second })).onlyMistakePasses).toBe(false);
  });

  it('does not depend on which reading comes first', () => {
    fc.assert(
      fc.property(between(0, 0.2), between(0, 0.2), (a, b) => {
        const sum = (x: number, y: number) =>
          valueOf(depthAcrossJoint({ first: { ...first, reading: x }, second: { ...second, reading: y } })).distance;
        expect(sum(a, b)).toBe(sum(b, a));
      }),
    );
  });

  it('withstands odd input', () => sweep(depthAcrossJoint, { first, second, band: band(36, 46) }));
});
