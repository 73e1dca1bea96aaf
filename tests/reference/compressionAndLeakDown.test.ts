import { describe, expect, it } from 'vitest';
import { atSeaLevel, standardPressure } from '@/domain/measure/atmosphere';
import { judgeCompression } from '@/domain/measure/compression';
import { compressionRatio } from '@/domain/measure/compressionRatio';
import { judgeLeakDown, lossPercent, testerOrifice } from '@/domain/measure/leakDown';
import { INCH, MM, PSI, relative, valueOf } from '../factories/measures';

/** Marks: S seen in the document's own text, Q quoted in a secondary page, M from memory, C computed here. */
const psi = (...values: number[]) => values.map((value) => value * PSI);

describe('compression rules', () => {
  it('S (TM 5-4210-230-14&P-1 Add. 2): the lowest must be 75 % of the highest; numbers C', () => {
    const passes = (...list: number[]) =>
      valueOf(judgeCompression(psi(...list), { lowestOfHighest: { min: 75 } })).passes;
    expect(passes(160, 140, 120)).toBe(true);
    expect(passes(160, 140, 119)).toBe(false);
  });

  it('S (TM 1-1500-204-23-1, aircraft): a cylinder 20 % below the average is to be replaced; numbers C', () => {
    const at = (low: number) =>
      valueOf(judgeCompression(psi(150, 150, 150, low), { belowAverage: { max: 20 } })).cylinders[3]?.average?.at;
    // With the low one in it, the average is (450 + low) / 4: 20 % below it is 112.5.
    expect(at(113)).toBe('in');
    expect(at(112)).toBe('over');
  });

  it('S (TM 10-3930-618-20): no more than 10 psi between cylinders; numbers C', () => {
    const at = (low: number) =>
      valueOf(judgeCompression(psi(150, low), { difference: { max: 10 * PSI } })).judged.difference?.at;
    expect([at(140), at(139.9)]).toEqual(['in', 'over']);
  });

  it('the rules do not agree (C): 160 and 125 psi pass one and fail another', () => {
    const found = valueOf(
      judgeCompression(psi(160, 125), {
        lowestOfHighest: { min: 75 },
        belowAverage: { max: 20 },
        difference: { max: 10 * PSI },
      }),
    );
    expect(found.judged).toMatchObject({ lowestOfHighest: { at: 'in' }, difference: { at: 'over' } });
    expect(found.cylinders[1]?.average?.at).toBe('in');
  });
});

describe('standard atmosphere', () => {
  it.each([
    [0, 101325],
    [1000, 89874.6],
    [2000, 79495.2],
    [3000, 70108.5],
    [5000, 54019.9],
  ])('Q (ISO 2533 table as quoted in public test suites): %d m, %d Pa', (altitude, want) => {
    expect(relative(valueOf(standardPressure(altitude)), want)).toBeLessThan(2e-6);
  });

  it('C: 1000 kPa on the gauge at 1000 m would be 1127 kPa at sea level', () => {
    expect(valueOf(atSeaLevel(1e6, valueOf(standardPressure(1000)))) / 1000).toBeCloseTo(1127.4, 1);
  });
});

describe('leak-down', () => {
  it('S/Q (AC 43.13-1B ¶ 8-14): 80 psi in; a loss of more than 25 % of it is suspect, 80 over 60', () => {
    expect(valueOf(lossPercent(80 * PSI, 60 * PSI))).toBeCloseTo(25, 12);
    const at = (cylinder: number) =>
      valueOf(judgeLeakDown([{ supply: 80 * PSI, cylinder: cylinder * PSI }], { max: 25 })).cylinders[0]?.judged?.at;
    expect([at(60.5), at(60), at(59.5)]).toEqual(['in', 'in', 'over']);
  });

  it.each([
    [4.999, 0.04],
    [5, 0.06],
    [5.125, 0.06],
  ])(
    'Q (FAA safety tip, Nov 2011, quoting AC 43.13-1B Chg 1): bore %d in, orifice %d in, 0.250 long, 60° approach',
    (bore, want) => {
      const found = valueOf(testerOrifice(bore * INCH));
      expect(found.diameter / INCH).toBeCloseTo(want, 12);
      expect(found.length / INCH).toBeCloseTo(0.25, 12);
      expect(found.approach).toBe(60);
    },
  );
});

describe('compression ratio (C: no published example found)', () => {
  it('a cylinder of 450 cm³ over 50 cm³ is 10:1', () => {
    // A bore of 100 mm takes 7.854 cm³ for each mm.
    const disc = Math.PI * 0.05 ** 2;
    const found = valueOf(
      compressionRatio({
        bore: 100 * MM,
        stroke: 450e-6 / disc,
        chamber: 30e-6,
        gasketBore: 100 * MM,
        gasketThickness: 10e-6 / disc,
        deckClearance: 5e-6 / disc,
        pistonVolume: 5e-6,
      }),
    );
    expect(found.ratio).toBeCloseTo(10, 12);
  });
});
