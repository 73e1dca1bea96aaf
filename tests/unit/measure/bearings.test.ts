import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bearingClearance, clearanceFromShells } from '@/domain/measure/bearings';
import { clearanceStack, journalForClearance, type SizeLimits } from '@/domain/measure/clearanceStack';
import { crankEndPlay } from '@/domain/measure/endPlay';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, valueOf } from '../../factories/measures';

const mm = (...values: number[]) => values.map((value) => value * MM);
const microns = (metres: number) => Math.round(metres * 1e9) / 1e3;
const band = { min: 0.022 * MM, max: 0.048 * MM };
const diameters = fc.array(between(0.04, 0.06), { minLength: 1, maxLength: 6 });

describe('bearing clearance', () => {
  it('is the bore less the journal', () => {
    const found = valueOf(bearingClearance({ bore: mm(52.022), journal: mm(51.99), band }));
    expect([found.least, found.greatest, found.mean].map(microns)).toEqual([32, 32, 32]);
    expect(found.judged).toEqual({ at: 'in', by: 0 });
  });

  it('takes the tightest and the loosest of several readings, and judges the worse', () => {
    const found = valueOf(bearingClearance({ bore: mm(52.02, 52.03), journal: mm(51.99, 51.98), band }));
    expect([found.least, found.greatest, found.mean].map(microns)).toEqual([30, 50, 40]);
    expect(found.judged).toMatchObject({ at: 'over', by: expect.closeTo(2e-6, 12) });
    const tight = valueOf(bearingClearance({ bore: mm(52, 52.05), journal: mm(51.99), band }));
    expect(tight.judged).toMatchObject({ at: 'under' });
  });

  it('passes a clearance that is the limit to the digit', () => {
    for (const journal of [51.998, 51.972])
      expect(valueOf(bearingClearance({ bore: mm(52.02), journal: mm(journal), band })).judged?.at).toBe('in');
  });

  it('shows a shaft that is gripped as less than zero', () => {
    const found = valueOf(bearingClearance({ bore: mm(51.98), journal: mm(51.99), band }));
    expect(microns(found.least)).toBe(-10);
    expect(found.judged?.at).toBe('under');
  });

  it('does not depend on the order of the readings', () => {
    fc.assert(
      fc.property(diameters, diameters, (bore, journal) => {
        const once = valueOf(bearingClearance({ bore, journal, band }));
        const turned = valueOf(bearingClearance({ bore: bore.toReversed(), journal: journal.toReversed(), band }));
        expect(turned).toEqual(once);
        expect(once.greatest).toBeGreaterThanOrEqual(once.least);
      }),
    );
  });

  it('opens by what the journal loses', () => {
    fc.assert(
      fc.property(between(51.9, 52), between(0, 0.05), (journal, worn) => {
        const at = (size: number) => valueOf(bearingClearance({ bore: mm(52.022), journal: mm(size), band }));
        expect(at(journal - worn).least).toBeGreaterThanOrEqual(at(journal).least);
        if (at(journal).judged!.at === 'over') expect(at(journal - worn).judged!.at).toBe('over');
      }),
    );
  });

  it('forecasts by housing and shells what the bore will measure', () => {
    const built = { housing: mm(56.022), shell: mm(2, 2), journal: mm(51.99), band };
    expect(microns(valueOf(clearanceFromShells(built)).least)).toBe(32);
    expect(microns(valueOf(clearanceFromShells({ ...built, shell: mm(2) })).least)).toBe(32);
    expect(microns(valueOf(clearanceFromShells({ ...built, shell: mm(2, 2.004) })).least)).toBe(28);
    expect(clearanceFromShells({ ...built, housing: mm(56.022, 3), journal: mm(1) }).ok).toBe(false);
    expect(clearanceFromShells({ ...built, shell: mm(30) })).toEqual({
      ok: false,
      problems: [{ field: 'shell', message: 'The shell walls fill the whole housing bore.' }],
    });
  });

  it('withstands odd input', () => {
    sweep(bearingClearance, { bore: mm(52.022, 52.024), journal: mm(51.99), band });
    sweep(clearanceFromShells, { housing: mm(56.022), shell: mm(2, 2), journal: mm(51.99), band });
  });
});

describe('clearance of toleranced sizes', () => {
  const sizes = fc
    .tuple(between(0.04, 0.06), between(0, 1e-4))
    .map(([min, width]): SizeLimits => ({ min, max: min + width }));

  it('holds every pair of sizes, and is met at its ends', () => {
    const share = between(0, 1);
    fc.assert(
      fc.property(sizes, sizes, share, share, (bore, journal, a, b) => {
        const stack = valueOf(clearanceStack(bore, journal));
        const at = ({ min, max }: SizeLimits, part: number) => min + (max - min) * part;
        const clearance = at(bore, a) - at(journal, b);
        expect(clearance).toBeGreaterThanOrEqual(stack.min - 1e-15);
        expect(clearance).toBeLessThanOrEqual(stack.max + 1e-15);
      }),
    );
  });

  it('gives the journal back', () => {
    fc.assert(
      fc.property(sizes, sizes, (bore, journal) => {
        const back = valueOf(journalForClearance(bore, valueOf(clearanceStack(bore, journal))));
        expect(Math.abs(back.min - journal.min)).toBeLessThan(1e-12);
        expect(Math.abs(back.max - journal.max)).toBeLessThan(1e-12);
      }),
    );
  });

  it('says when no journal will do, and when sizes stand the wrong way round', () => {
    const bore = { min: 0.05, max: 0.0501 };
    expect(journalForClearance(bore, { min: 2e-5, max: 5e-5 })).toEqual({
      ok: false,
      problems: [{ field: 'clearance.max', message: 'No journal keeps these bores within this oil clearance.' }],
    });
    expect(clearanceStack({ min: 0.0502, max: 0.05 }, bore)).toEqual({
      ok: false,
      problems: [{ field: 'bore.max', message: 'The greatest bearing bore cannot be less than the least.' }],
    });
  });

  it('withstands odd input', () => {
    const bore = { min: 0.052, max: 0.05202 };
    const input = { bore, journal: { min: 0.05197, max: 0.05198 } };
    sweep(({ bore, journal }: typeof input) => clearanceStack(bore, journal), input);
    const wanted = { bore, clearance: { min: 2e-5, max: 5e-5 } };
    sweep(({ bore, clearance }: typeof wanted) => journalForClearance(bore, clearance), wanted);
  });
});

describe('end play', () => {
  const limits = { min: 0.06 * MM, max: 0.2 * MM };

  it('is how far the dial moves, whichever way it counts', () => {
    const found = valueOf(crankEndPlay({ forward: mm(0.12), back: mm(-0.01), band: limits }));
    expect(microns(found.play)).toBe(130);
    expect(found.judged?.at).toBe('in');
    expect(valueOf(crankEndPlay({ forward: mm(-0.01), back: mm(0.12), band: limits }))).toEqual(found);
  });

  it('takes the mean of several and says how well they repeat', () => {
    const found = valueOf(crankEndPlay({ forward: mm(0.12, 0.14), back: mm(0, 0) }));
    expect([found.play, found.range].map(microns)).toEqual([130, 20]);
    expect(found.judged).toBeNull();
  });

  it('wants a reading back for each forward', () => {
    expect(crankEndPlay({ forward: mm(0.12, 0.13), back: mm(0) })).toEqual({
      ok: false,
      problems: [{ field: 'back', message: 'There must be as many readings back as forward.' }],
    });
  });

  it('withstands odd input', () => sweep(crankEndPlay, { forward: mm(0.12), back: mm(-0.01), band: limits }));
});
