import { readFileSync, readdirSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ClampInput } from '@/domain/measure/clampLoad';
import { MIX_UP_TOLERANCE, mixUpOfSize, mixUpsOfChange } from '@/domain/measure/unitMixUp';
import { parseProcedure } from '@/domain/procedure/parse';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, ODD_TEXTS, expectRefused, expectSound } from './sweep';

const says = (before: number, after: number) => valueOf(mixUpsOfChange(before, after)).map((found) => found.says);
const torque = fc.double({ min: 0.1, max: 2000, noNaN: true });

describe('mixUpsOfChange', () => {
  it.each<[number, number, string]>([
    [10, 13.56, 'The torque rose by a factor near 1.36, as if a figure in N·m had been taken for lbf·ft.'],
    [10, 7.4, 'The torque fell by a factor near 1.36, as if a figure in lbf·ft had been taken for N·m.'],
    [10, 89, 'The torque rose by a factor near 8.85, as if a figure in lbf·in had been taken for N·m.'],
    [10, 1.13, 'The torque fell by a factor near 8.85, as if a figure in N·m had been taken for lbf·in.'],
    [100, 10.2, 'The torque fell by a factor near 9.81, as if a figure in kgf·m had been taken for N·m.'],
    [10, 120, 'The torque rose by a factor near 12, as if a figure in lbf·in had been taken for lbf·ft.'],
    [10, 102, 'The torque rose by a factor near 10.2, as if a figure in kgf·cm had been taken for N·m.'],
  ])('%d to %d', (before, after, sentence) => {
    expect(says(before, after)[0]).toBe(sentence);
  });

  it('tells a slip of the decimal point as both of its neighbours', () => {
    expect(
      valueOf(mixUpsOfChange(10, 100))
        .map(({ takenFor }) => takenFor)
        .sort(),
    ).toEqual(['N·m', 'kgf·m']);
  });

  it('does not cry wolf: no change of up to 20 % either way, at any tolerance that it takes', () => {
    fc.assert(
      fc.property(
        torque,
        fc.double({ min: 1 / 1.2, max: 1.2, noNaN: true }),
        fc.double({ min: 0, max: 0.05, noNaN: true }),
        (before, ratio, tolerance) => {
          expect(valueOf(mixUpsOfChange(before, before * ratio, tolerance))).toEqual([]);
          expect(valueOf(mixUpsOfChange(before, before * 0.8, tolerance))).toEqual([]);
        },
      ),
    );
  });

  it('leaves two, three and five times the torque alone', () => {
    for (const times of [1.5, 2, 3, 4, 5, 6, 20]) {
      expect(says(10, 10 * times)).toEqual([]);
      expect(says(10 * times, 10)).toEqual([]);
    }
  });

  it('names the same pair the other way round when old and new change places', () => {
    fc.assert(
      fc.property(torque, fc.constantFrom(1.355818, 8.850746, 9.80665, 10.19716, 12), (before, factor) => {
        const there = valueOf(mixUpsOfChange(before, before * factor))[0];
        const back = valueOf(mixUpsOfChange(before * factor, before))[0];
        expect([back?.takenFor, back?.was]).toEqual([there?.was, there?.takenFor]);
      }),
    );
  });

  it('ends at its tolerance', () => {
    expect(says(1, 1.3558179 * (1 + MIX_UP_TOLERANCE - 1e-6))).toHaveLength(1);
    expect(says(1, 1.3558179 * (1 + MIX_UP_TOLERANCE + 1e-6))).toHaveLength(0);
  });

  it('never throws, and never answers with what is no number', () => {
    const fields = /^(before|after|tolerance)$/;
    for (const bad of [...EXTREMES, ...NO_NUMBERS])
      for (const other of [10, ...EXTREMES]) {
        expectSound(mixUpsOfChange(bad, other), fields);
        expectSound(mixUpsOfChange(other, bad), fields);
      }
    for (const bad of [NaN, -1, 0.06, Infinity]) expectRefused(mixUpsOfChange(10, 10, bad), 'tolerance');
    expectRefused(mixUpsOfChange(0, 10), 'before');
    expectRefused(mixUpsOfChange(1e308, 5e-324), 'after');
  });
});

describe('mixUpOfSize', () => {
  const m6: ClampInput = { nm: 10, thread: 'M6', pitch: 1, class: '8.8', condition: 'dry' };
  const found = (changes: Partial<Parameters<typeof mixUpOfSize>[0]>) => valueOf(mixUpOfSize({ ...m6, ...changes }));

  it('sees lbf·in that were typed as N·m', () => {
    expect(found({ nm: 89 })).toEqual({
      was: 'lbf·in',
      takenFor: 'N·m',
      says: 'The torque is over the proof load for this fastener, but the same figure in lbf·in would be sensible; it was entered in N·m.',
    });
  });

  it('sees kgf·m that were typed as N·m', () => {
    expect(found({ nm: 1.02 })).toMatchObject({ was: 'kgf·m', takenFor: 'N·m' });
  });

  it('sees lbf·in that were typed as lbf·ft, and the other way', () => {
    expect(found({ nm: 89 * 1.3558, enteredIn: 'lbf·ft' })).toMatchObject({ was: 'lbf·in' });
    expect(found({ nm: 7.4 * 0.11298, enteredIn: 'lbf·in' })).toMatchObject({ was: 'lbf·ft' });
  });

  it.each<[string, Partial<Parameters<typeof mixUpOfSize>[0]>]>([
    ['a plausible torque', {}],
    ['a torque that is a little over', { nm: 15 }],
    ['a torque that no unit makes sensible', { nm: 2000 }],
    ['a pipe thread', { thread: 'G 1/4', pitch: undefined }],
    ['no class', { nm: 89, class: undefined }],
    ['a snug torque before an angle', { nm: 1, angles: [90] }],
  ])('says nothing of %s', (_name, changes) => {
    expect(found(changes)).toBeNull();
  });

  it('says nothing of any share of proof from 10 to 100 %', () => {
    const proof = 0.2 * 0.006 * 11_671;
    fc.assert(
      fc.property(fc.double({ min: 0.101, max: 0.999, noNaN: true }), (share) => {
        expect(found({ nm: share * proof })).toBeNull();
      }),
    );
  });

  it('says nothing of any torque that the book ships', () => {
    const torques = readdirSync('content/procedures').flatMap((name) => {
      const parsed = parseProcedure(readFileSync(`content/procedures/${name}`, 'utf8'));
      return parsed.ok ? parsed.procedure.frontmatter.torques : [];
    });
    expect(torques.length).toBeGreaterThan(30);
    for (const torque of torques) expect(valueOf(mixUpOfSize(torque)), torque.key).toBeNull();
  });

  it('never throws, and never answers with what is no number', () => {
    const fields = /^(nm|thread|pitch|condition|enteredIn)$/;
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) expectSound(mixUpOfSize({ ...m6, nm: bad }), fields);
    for (const text of ODD_TEXTS) {
      expectRefused(mixUpOfSize({ ...m6, thread: text }), 'thread');
      expectRefused(mixUpOfSize({ ...m6, enteredIn: text as 'N·m' }), 'enteredIn');
    }
  });
});
