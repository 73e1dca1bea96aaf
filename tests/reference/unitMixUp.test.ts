import { describe, expect, it } from 'vitest';
import { convert } from '@/domain/measure/convert';
import { mixUpOfSize, mixUpsOfChange } from '@/domain/measure/unitMixUp';
import { valueOf } from '../factories/measures';

/** Factors of NIST SP 811, appendix B.8 (quoted): lbf·ft 1.355 818, lbf·in 0.112 984 8, kgf·m 9.806 65 N·m. */
describe('what a figure becomes when its unit is taken for another', () => {
  it.each([
    [1.355818, 'N·m', 'lbf·ft'],
    [1 / 1.355818, 'lbf·ft', 'N·m'],
    [0.1129848, 'N·m', 'lbf·in'],
    [1 / 0.1129848, 'lbf·in', 'N·m'],
    [9.80665, 'N·m', 'kgf·m'],
    [1 / 9.80665, 'kgf·m', 'N·m'],
    [0.0980665, 'N·m', 'kgf·cm'],
    [1 / 0.0980665, 'kgf·cm', 'N·m'],
    [12, 'lbf·in', 'lbf·ft'],
    [1 / 12, 'lbf·ft', 'lbf·in'],
  ])('times %d: %s taken for %s', (factor, was, takenFor) => {
    expect(valueOf(mixUpsOfChange(27, 27 * factor))[0]).toMatchObject({ was, takenFor });
  });
});

/** Fine threads of AC 43.13-1B, table 7-1: the most of each recommended range in lbf·in (seen, two copies agree). */
describe('torques of AC 43.13-1B, table 7-1, in bolts of SAE grade 5', () => {
  const rows = [
    ['1/4-28 UNF', 50, 70],
    ['3/8-24 UNF', 160, 190],
    ['7/16-20 UNF', 450, 500],
    ['1/2-20 UNF', 480, 690],
  ] as const;
  const bolt = (thread: string, nm: number) => valueOf(mixUpOfSize({ nm, thread, class: 'SAE 5', condition: 'dry' }));

  it.each(rows)('%s at %d to %d lbf·in is no mix-up', (thread, ...range) => {
    for (const figure of range) {
      const made = convert(figure, 'lbf·in', 'N·m');
      expect(bolt(thread, made.ok ? made.value : NaN)).toBeNull();
    }
  });

  it.each(rows)('%s: %d to %d entered as N·m is caught at its upper end', (thread, _least, most) => {
    expect(bolt(thread, most)).toMatchObject({ was: 'lbf·in', takenFor: 'N·m' });
  });
});
