import { describe, expect, it } from 'vitest';
import { checkVin } from '@/domain/measure/vin';
import { valueOf } from '../factories/measures';

describe('check digit of 49 CFR 565.15(c)', () => {
  it.each([
    ['1J9RP1A36A1644345', 'fits', '6', 'NHTSA, Outline for New Manufacturer Information, p. 18 (seen)'],
    ['11111111111111111', 'fits', '1', 'common test number; 89 = 8·11 + 1, computed here'],
    ['1J9RP1A35A1644345', 'does not fit', '6', 'computed here'],
    ['1J9RP1A36A1644354', 'does not fit', '7', 'last two swapped, 315, computed here'],
    ['1A9RP1A36A1644345', 'fits', '6', 'wrong, but A and J count the same: the limit of the method, computed here'],
    ['1M8GDM9AXKP042788', 'fits', 'X', 'the worked example of most tables, remainder 10, from memory'],
    ['1J9RP1A36O1644345', 'not checked', null, 'the letter O is not used, rule'],
    ['1J9RP1A36A164434', 'not checked', null, '16 characters, rule'],
  ])('%s: %s, asks for %s (%s)', (vin, verdict, expected, _source) => {
    const check = valueOf(checkVin(vin));
    expect(check.verdict).toBe(verdict);
    expect(check.expected).toBe(expected);
    expect(check.warnings.length > 0).toBe(verdict !== 'fits');
  });

  it('sums as the NHTSA document prints it: 314, which is 28·11 + 6 (seen)', () => {
    // Its table V of decimal rests is not used: it prints 7/11 as .634.
    expect(valueOf(checkVin('1J9RP1A36A1644345')).sum).toBe(314);
  });
});
