import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { proofLoad, proofStress, stressArea } from '@/domain/measure/fasteners';
import { type ScrewThread, readThread } from '@/domain/measure/threads';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, ODD_TEXTS, expectRefused, expectSound } from './sweep';

const screw = (text: string, pitch?: number) => valueOf(readThread(text, pitch)) as ScrewThread;

describe('stressArea', () => {
  it('is smaller than the rod and grows as the pitch gets finer', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('metric' as const, 'unified' as const),
        fc.double({ min: 0.002, max: 0.04, noNaN: true }),
        fc.double({ min: 0.02, max: 0.3, noNaN: true }),
        (kind, diameter, share) => {
          const area = valueOf(stressArea({ kind, diameter, pitch: share * diameter }));
          const finer = valueOf(stressArea({ kind, diameter, pitch: share * diameter * 0.9 }));
          expect(area).toBeGreaterThan(0);
          expect(finer).toBeGreaterThan(area);
          expect(finer).toBeLessThan((Math.PI / 4) * diameter ** 2);
        },
      ),
    );
  });

  it('never throws, and never answers with what is no number', () => {
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) {
      expectSound(stressArea({ kind: 'metric', diameter: bad, pitch: 0.001 }), /^(diameter|pitch)$/);
      expectSound(stressArea({ kind: 'metric', diameter: 0.01, pitch: bad }), /^pitch$/);
    }
    expectRefused(stressArea({ kind: 'metric', diameter: 0.001, pitch: 0.002 }), 'pitch');
    expectRefused(stressArea({ kind: 'metric', diameter: 1e308, pitch: 1 }), 'diameter');
  });
});

describe('proofStress', () => {
  const thread = screw('M10');

  it.each(['8.8', ' 8.8 ', 'ISO 8.8', 'class 8.8'])('reads "%s"', (text) => {
    expect(valueOf(proofStress(text, thread))).toEqual({ stress: 580e6, standard: 'ISO 898-1 class 8.8' });
  });
  it.each(['SAE 5', 'sae 5', 'grade 5', 'SAE J429 grade 5', 'SAE grade 5'])('reads "%s"', (text) => {
    expect(valueOf(proofStress(text, screw('3/8-16 UNC'))).standard).toBe('SAE J429 grade 5');
  });

  it.each([
    ['', 'M10', 'No property class is given; look at the head of the bolt.'],
    ['A4-70', 'M6', 'A4-70 is stainless steel by ISO 3506-1; the book holds no proof stress for it.'],
    ['8', 'M10', '"8" alone is the class of a nut or an inch grade; write 8.8 for a class, SAE 8 for a grade.'],
    [
      '14.9',
      'M10',
      '"14.9" is no property class that the book knows; known are 4.6, 4.8, 5.8, 8.8, 9.8, 10.9, 12.9 of ISO 898-1 and SAE 1, 2, 5, 8 of SAE J429.',
    ],
    ['8.8', '3/8-16 UNC', 'ISO 898-1 class 8.8 is for metric threads; inch bolts have SAE grades.'],
    ['SAE 5', 'M10', 'SAE J429 grade 5 is for inch threads; metric bolts have ISO classes.'],
    ['9.8', 'M18', 'ISO 898-1 class 9.8 does not cover a bolt of this size.'],
    ['SAE 5', '#10-32 UNF', 'SAE J429 grade 5 does not cover a bolt of this size.'],
  ])('refuses "%s" for %s', (text, size, message) => {
    expect(proofStress(text, screw(size))).toEqual({ ok: false, problems: [{ field: 'class', message }] });
  });

  it('never rises with the size of an inch bolt', () => {
    for (const grade of ['SAE 1', 'SAE 2', 'SAE 5', 'SAE 8']) {
      const stresses = ['1/4-20 UNC', '3/4-10 UNC', '7/8-9 UNC', '1-8 UNC', '9/8-7 UNC', '3/2-6 UNC'].map(
        (size) => valueOf(proofStress(grade, screw(size))).stress,
      );
      expect(stresses).toEqual([...stresses].sort((a, b) => b - a));
    }
  });

  it('never throws, and never answers with what is no number', () => {
    for (const text of [...ODD_TEXTS, ...(NO_NUMBERS as unknown as string[])])
      if (text !== ('7' as string)) expectRefused(proofStress(text, thread), 'class');
    for (const bad of [...EXTREMES, ...NO_NUMBERS])
      expectSound(proofStress('8.8', { kind: 'metric', diameter: bad }), /^(diameter|class)$/);
  });
});

describe('proofLoad', () => {
  it('is area times stress', () => {
    const load = valueOf(proofLoad(screw('M8', 1), '10.9'));
    expect(load.load).toBe(load.area * load.stress);
    expect(load).toMatchObject({ stress: 830e6, standard: 'ISO 898-1 class 10.9' });
  });

  it('passes a class that is not known on as the problem of the class', () => {
    expectRefused(proofLoad(screw('M8'), 'A2-70'), 'class');
    expectRefused(proofLoad({ ...screw('M8'), pitch: NaN }, '8.8'), 'pitch');
  });
});
