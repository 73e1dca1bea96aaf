import { describe, expect, it } from 'vitest';
import { gapByFactor, gapChange, judgeRingGaps } from '@/domain/measure/rings';
import { chooseShim, exactShim } from '@/domain/measure/shims';
import { shimSizes } from '@/domain/measure/shimStock';
import { INCH, MM, relative, valueOf } from '../factories/measures';

/** Marks: S seen in the document's own text, Q quoted in a secondary page, C computed here. */
describe('ring end gap', () => {
  it.each([
    ['street', 0.004, 0.016],
    ['modified or nitrous', 0.005, 0.02],
    ['racing', 0.0055, 0.022],
    ['racing, nitrous or turbo', 0.006, 0.024],
    ['blown', 0.007, 0.028],
  ])("Q (forum quotation of a ring maker's table): %s, %d of a 4.00 in bore is %d in", (_, factor, want) => {
    expect(valueOf(gapByFactor(4 * INCH, factor)) / INCH).toBeCloseTo(want, 12);
  });

  it.each([
    ['upper compression', 0.016, 0.031],
    ['others', 0.012, 0.029],
  ])('S (TM 5-1940-277-34 p. 3-25): %s %d to %d in; a value on the limit passes', (_, least, greatest) => {
    const band = { min: least * INCH, max: greatest * INCH };
    const at = (gap: number) => valueOf(judgeRingGaps({ gaps: [gap * INCH], band })).gaps[0]?.judged?.at;
    expect([least - 0.001, least, greatest, greatest + 0.001].map(at)).toEqual(['under', 'in', 'in', 'over']);
    // The same limit as the manual prints it in millimetres.
    const printed = { min: Math.round(least * 25400) / 1e6, max: Math.round(greatest * 25400) / 1e6 };
    expect(relative(printed.min, band.min)).toBeLessThan(2e-3);
    expect(relative(printed.max, band.max)).toBeLessThan(2e-3);
  });

  it('the trap of TM 5-3825-229-14&P (S, inconsistent): 0.0012 in undersize changes the gap by 0.0038 in (C), not by the printed 0.0031', () => {
    const change = valueOf(gapChange(-0.0012 * INCH)) / INCH;
    expect(change).toBeCloseTo(-0.00376991, 8);
    expect(Math.abs(change + 0.0038)).toBeLessThan(0.00005);
    expect(Math.abs(change + 0.0031)).toBeGreaterThan(0.0006);
  });
});

describe('bucket shims: N = T + (A − V) (Q, secondary page)', () => {
  const stock = { min: 2.5 * MM, max: 3.3 * MM, step: 0.05 * MM };

  it('Q: seventeen sizes, 2.500 to 3.300 mm in steps of 0.050', () => {
    const sizes = shimSizes(stock).map((size) => size / MM);
    expect(sizes).toHaveLength(17);
    expect(sizes[0]).toBeCloseTo(2.5, 9);
    expect(sizes[16]).toBeCloseTo(3.3, 9);
  });

  it('C: old 2.70, measured 0.35, wanted 0.25 asks for 2.80, which is in stock', () => {
    const reading = { old: 2.7 * MM, measured: 0.35 * MM, target: 0.25 * MM };
    expect(valueOf(exactShim(reading)) / MM).toBeCloseTo(2.8, 9);
    const found = valueOf(chooseShim({ ...reading, stock }));
    expect(found.neighbours).toHaveLength(1);
    expect(found.chosen.thickness / MM).toBeCloseTo(2.8, 9);
    expect(found.chosen.lash / MM).toBeCloseTo(0.25, 9);
  });

  it('C: old 2.70, measured 0.12, wanted 0.20 asks for 2.62; 2.60 gives 0.22 and 2.65 gives 0.17', () => {
    const found = valueOf(chooseShim({ old: 2.7 * MM, measured: 0.12 * MM, target: 0.2 * MM, stock }));
    expect(found.exact / MM).toBeCloseTo(2.62, 9);
    expect(found.neighbours.map(({ thickness, lash }) => [thickness / MM, lash / MM])).toEqual([
      [expect.closeTo(2.6, 9), expect.closeTo(0.22, 9)],
      [expect.closeTo(2.65, 9), expect.closeTo(0.17, 9)],
    ]);
    expect(found.chosen).toBe(found.neighbours[0]);
  });
});
