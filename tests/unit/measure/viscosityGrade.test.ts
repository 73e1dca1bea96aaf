import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { viscosityGrades } from '@/domain/measure/viscosityGrade';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, expectRefused, expectSound } from './sweep';

const at = (mm2: number) => valueOf(viscosityGrades(mm2 * 1e-6));

describe('viscosityGrades', () => {
  it.each([
    [3.9, 'Thinner than every grade of SAE J300.'],
    [4.5, 'Fits SAE 8.'],
    [7.0, 'Fits SAE 12, SAE 16 and SAE 20; these grades overlap.'],
    [10.4, 'Fits SAE 30.'],
    [26.1, 'Thicker than every grade of SAE J300.'],
  ])('%d mm²/s: %s', (mm2, says) => {
    expect(at(mm2).says).toBe(says);
  });

  it('leaves no gap from 4.0 to 26.1, and from 9.3 on no overlap', () => {
    fc.assert(
      fc.property(fc.double({ min: 4.0, max: 26.0999, noNaN: true }), (mm2) => {
        const fits = at(mm2).fits.length;
        expect(fits).toBeGreaterThan(0);
        if (mm2 >= 9.3) expect(fits).toBe(1);
      }),
    );
  });

  it('never names a thinner grade for a thicker oil', () => {
    const viscosity = fc.double({ min: 0.1, max: 40, noNaN: true });
    fc.assert(
      fc.property(viscosity, viscosity, (a, b) => {
        const [thin, thick] = [at(Math.min(a, b)), at(Math.max(a, b))];
        if (thin.fits[0] && thick.fits[0])
          expect(Number(thick.fits[0].grade)).toBeGreaterThanOrEqual(Number(thin.fits[0].grade));
        expect(thick.winter).toEqual(expect.arrayContaining(thin.winter));
      }),
    );
  });

  it('never throws, and never answers with what is no number', () => {
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) expectSound(viscosityGrades(bad), /^viscosity$/);
    for (const bad of [NaN, Infinity, -Infinity, 0, -1]) expectRefused(viscosityGrades(bad), 'viscosity');
  });
});
