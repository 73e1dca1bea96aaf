import { describe, expect, it } from 'vitest';
import { bearingClearance, clearanceFromShells } from '@/domain/measure/bearings';
import { judgeBore } from '@/domain/measure/bore';
import { clearanceStack, journalForClearance } from '@/domain/measure/clearanceStack';
import { judgeJournal } from '@/domain/measure/journals';
import { INCH, MM, valueOf } from '../factories/measures';

/** Marks: S seen in the document's own text, Q quoted in a secondary page, M from memory, C computed here. */
const inches = (value: number) => value * INCH;
const size = (min: number, max: number) => ({ min: inches(min), max: inches(max) });

describe('bores', () => {
  it('S (TM 9-2815-202-34 p. 4-147): taper limit 0.002 in, out-of-round limit 0.0025 in, by two heights; diameters C', () => {
    const limits = { taper: { max: inches(0.002) }, outOfRound: { max: inches(0.0025) } };
    const at = (top: number, bottom: number, across: number) => {
      const readings = [
        [inches(top), inches(across)],
        [inches(bottom), inches(bottom)],
      ];
      return valueOf(judgeBore({ readings, limits })).judged;
    };
    expect(at(4.358, 4.356, 4.3571)).toMatchObject({ taper: { at: 'in' }, outOfRound: { at: 'in' } });
    expect(at(4.3581, 4.356, 4.3571)).toMatchObject({ taper: { at: 'over' }, outOfRound: { at: 'in' } });
    expect(at(4.3571, 4.356, 4.3546)).toMatchObject({ taper: { at: 'in' }, outOfRound: { at: 'in' } });
    expect(at(4.3572, 4.356, 4.3546)).toMatchObject({ taper: { at: 'in' }, outOfRound: { at: 'over' } });
  });

  it('Q (small-engine service manual): taper B−A and D−C on the same axis, out-of-round A against C and B against D; numbers C', () => {
    const [A, B, C, D] = [2.7503, 2.7498, 2.7509, 2.75];
    const found = valueOf(
      judgeBore({
        readings: [
          [inches(B), inches(D)],
          [inches(A), inches(C)],
        ],
      }),
    );
    expect(found.taper.map((value) => value / INCH)).toEqual([expect.closeTo(B - A, 9), expect.closeTo(D - C, 9)]);
    expect(found.outOfRound.map((value) => value / INCH)).toEqual([
      expect.closeTo(Math.abs(B - D), 9),
      expect.closeTo(Math.abs(A - C), 9),
    ]);
  });

  it('Q (diesel service manual): roundness is the most |A−B| at a height, cylindricity the most (max − min) on an axis; numbers C', () => {
    const readings = [
      [102.021 * MM, 102.012 * MM],
      [102.015 * MM, 102.009 * MM],
      [102.018 * MM, 102.004 * MM],
    ];
    const found = valueOf(judgeBore({ readings }));
    expect(found.worstOutOfRound / MM).toBeCloseTo(0.014, 9);
    expect(found.cylindricity / MM).toBeCloseTo(0.008, 9);
    expect(found.worstTaper / MM).toBeCloseTo(0.008, 9);
  });
});

describe('journals', () => {
  it('S (TM 5-3805-262-34 p. 4-24): taper front against rear and out-of-round 90° apart, 0.0005 in each; diameters C', () => {
    const limits = { taper: { max: inches(0.0005) }, outOfRound: { max: inches(0.0005) } };
    const at = (rear: number) =>
      valueOf(judgeJournal({ readings: [[2.4995, 2.499].map(inches), [rear, 2.499].map(inches)], limits })).judged;
    expect(at(2.499)).toMatchObject({ taper: { at: 'in' }, outOfRound: { at: 'in' } });
    expect(at(2.4989)).toMatchObject({ taper: { at: 'over' }, outOfRound: { at: 'in' } });
  });

  it('S (TM 5-3805-281-24-2): taper 0.0025 mm in 25.4 mm of length, out-of-round 0.025 mm; diameters C', () => {
    const limits = { taperPerLength: { max: 0.0025 / 25.4 }, outOfRound: { max: 0.025 * MM } };
    const at = (taper: number, length: number) => {
      const readings = [
        [63.5 * MM, 63.475 * MM],
        [(63.5 - taper) * MM, 63.475 * MM],
      ];
      return valueOf(judgeJournal({ readings, length: length * MM, limits })).judged;
    };
    expect(at(0.0025, 25.4)).toMatchObject({ taperPerLength: { at: 'in' }, outOfRound: { at: 'in' } });
    expect(at(0.003, 25.4)).toMatchObject({ taperPerLength: { at: 'over' } });
    expect(at(0.003, 38.1)).toMatchObject({ taperPerLength: { at: 'in' } });
  });
});

describe('bearing clearance', () => {
  it('S (TM 9-2815-254-24 §f): bearing inside diameter less journal outside diameter; numbers C', () => {
    const found = valueOf(bearingClearance({ bore: [inches(2.502)], journal: [inches(2.4996)] }));
    expect(found.mean / INCH).toBeCloseTo(0.0024, 9);
  });

  it.each([
    ['rod', size(2.5015, 2.5035), size(0.0015, 0.0045), size(2.499, 2.5)],
    ['main', size(3.002, 3.003), size(0.001, 0.004), size(2.999, 3.001)],
  ])('S inputs (TM 5-3895-346-14), C result: the %s journal that keeps the clearance', (_, bore, clearance, want) => {
    const journal = valueOf(journalForClearance(bore, clearance));
    expect([journal.min / INCH, journal.max / INCH]).toEqual([
      expect.closeTo(want.min / INCH, 9),
      expect.closeTo(want.max / INCH, 9),
    ]);
    const stack = valueOf(clearanceStack(bore, want));
    expect([stack.min / INCH, stack.max / INCH]).toEqual([
      expect.closeTo(clearance.min / INCH, 9),
      expect.closeTo(clearance.max / INCH, 9),
    ]);
  });

  it('M (geometry): housing bore less two shell walls less journal; numbers C', () => {
    const built = { housing: [56.02 * MM], shell: [1.998 * MM], journal: [51.99 * MM] };
    expect(valueOf(clearanceFromShells(built)).mean / MM).toBeCloseTo(0.034, 9);
  });
});
