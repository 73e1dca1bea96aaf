import { describe, expect, it } from 'vitest';
import { viscosityGrades } from '@/domain/measure/viscosityGrade';
import { valueOf } from '../factories/measures';

const at100 = (mm2: number) => valueOf(viscosityGrades(mm2 * 1e-6));
const grades = (mm2: number) => at100(mm2).fits.map(({ grade }) => grade);

describe('SAE J300, January 2015 (two secondary works that agree, quoted)', () => {
  it.each<[string, number, number, string]>([
    ['8', 4.0, 6.1, '1.7'],
    ['12', 5.0, 7.1, '2.0'],
    ['16', 6.1, 8.2, '2.3'],
    ['20', 6.9, 9.3, '2.6'],
    ['30', 9.3, 12.5, '2.9'],
    ['40', 12.5, 16.3, '3.5'],
    ['50', 16.3, 21.9, '3.7'],
    ['60', 21.9, 26.1, '3.7'],
  ])('SAE %s from %d to below %d mm²/s, high shear %s', (grade, least, below, highShear) => {
    expect(grades(least)).toContain(grade);
    expect(grades(least - 0.001)).not.toContain(grade);
    expect(grades(below - 0.001)).toContain(grade);
    expect(grades(below)).not.toContain(grade);
    expect(at100(least).fits.find((fit) => fit.grade === grade)?.highShear).toMatch(new RegExp(`^${highShear}`));
  });

  it('lets one viscosity be of several grades', () => {
    expect(grades(6.5)).toEqual(['12', '16']);
    expect(grades(7.0)).toEqual(['12', '16', '20']);
  });

  it('is not the table of 1999, where 20 began at 5.6 and 40 had one high-shear least of 2.9 for the light winter grades', () => {
    expect(grades(5.8)).not.toContain('20');
    expect(at100(14).fits[0]?.highShear).toBe('3.5 for 0W, 5W and 10W-40, 3.7 for all other 40');
  });

  it.each<[number, string[]]>([
    [3.7, []],
    [3.8, ['0W', '5W']],
    [4.1, ['0W', '5W', '10W']],
    [5.6, ['0W', '5W', '10W', '15W', '20W']],
    [9.3, ['0W', '5W', '10W', '15W', '20W', '25W']],
  ])('%d mm²/s reaches the least of %s', (mm2, winter) => {
    expect(at100(mm2).winter).toEqual(winter);
  });
});
