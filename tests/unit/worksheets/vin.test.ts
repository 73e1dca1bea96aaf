import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf } from '../../factories/workedCase';

describe('the vehicle number check', () => {
  it.each([
    ['1j9rp1a36a1644345', 'none', 'The check digit of 1J9RP1A36A1644345 fits.'],
    ['1J9RP1A35A1644345', 'look', 'The ninth character is 5, but the others ask for 6.'],
    ['1J9RP1A36O1644345', 'look', 'A VIN never has the letter O; look for 1 or 0.'],
    ['W0L000051T2123', 'look', 'A VIN has 17 characters since 1981; this has 14.'],
  ])('%s: %s', (vin, verdict, opening) => {
    const made = answerOf('vin', { vin });
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toMatch(new RegExp(`^${opening}`));
  });

  it('shows the sum with the rest, also where the rest is ten', () => {
    const formula = (vin: string) => answerOf('vin', { vin }).results[0]?.formula?.metric;
    expect(formula('1J9RP1A36A1644345')).toBe('Value times weight, all places added: 314 = 28 · 11 + 6');
    expect(formula('1M8GDM9AXKP042788')).toMatch(/\+ 10, and 10 is written X$/);
  });

  it('never refuses a number that is there', () => {
    expect(answerOf('vin', { vin: '123' }).results).toEqual([]);
    expect(problemsOf('vin', { vin: '--' }).map(({ field }) => field)).toEqual(['vin']);
  });
});
