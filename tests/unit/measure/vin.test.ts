import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkVin } from '@/domain/measure/vin';
import { valueOf } from '../../factories/measures';
import { NO_NUMBERS, ODD_TEXTS, expectRefused, expectSound } from './sweep';

const SIGNS = [...'0123456789ABCDEFGHJKLMNPRSTUVWXYZ'];
/** A number whose ninth character was put right by the check itself. */
const right = fc.array(fc.constantFrom(...SIGNS), { minLength: 17, maxLength: 17 }).map((signs) => {
  const expected = valueOf(checkVin(signs.join(''))).expected ?? '';
  return [...signs.slice(0, 8), expected, ...signs.slice(9)];
});

/** The values once more, written out by groups as the regulation prints them: a plain model to check against. */
const GROUPS = ['', 'AJ1', 'BKS2', 'CLT3', 'DMU4', 'ENV5', 'FW6', 'GPX7', 'HY8', 'RZ9'];
const model = (vin: string): string => {
  const weights = '8765432X098765432';
  const sum = [...vin].reduce((total, sign, i) => {
    const weight = weights[i] === 'X' ? 10 : Number(weights[i]);
    return (
      total +
      weight *
        Math.max(
          0,
          GROUPS.findIndex((group) => group.includes(sign)),
        )
    );
  }, 0);
  return '0123456789X'[sum % 11]!;
};

describe('checkVin', () => {
  it('agrees with a plain model', () => {
    fc.assert(
      fc.property(right, (signs) => {
        const check = valueOf(checkVin(signs.join('')));
        expect(check).toMatchObject({ verdict: 'fits', expected: model(signs.join('')), warnings: [] });
      }),
      { numRuns: 500 },
    );
  });

  it('catches one wrong digit wherever it stands', () => {
    fc.assert(
      fc.property(right, fc.nat({ max: 16 }), fc.constantFrom(...'0123456789'), (signs, at, digit) => {
        fc.pre(at !== 8 && /\d/.test(signs[at] ?? '') && signs[at] !== digit);
        expect(valueOf(checkVin(signs.with(at, digit).join(''))).verdict).toBe('does not fit');
      }),
    );
  });

  it('reads small letters, spaces and hyphens', () => {
    expect(valueOf(checkVin(' 1j9 rp1a36-a1644345 '))).toMatchObject({ vin: '1J9RP1A36A1644345', verdict: 'fits' });
  });

  it.each([
    [
      '1J9RP1A35A1644345',
      [
        'The ninth character is 5, but the others ask for 6. Read the number again. Vehicles made for other markets than North America need not have a check digit.',
      ],
    ],
    ['1J9RP1A36O1644345', ['A VIN never has the letter O; look for 1 or 0.']],
    ['IJ9RP1A36O164434Q', ['A VIN never has the letters I, O, Q; look for 1 or 0.']],
    ['1J9RP1A36A164434', ['A VIN has 17 characters since 1981; this has 16.']],
    ['1J9RP1A36A16443455', ['A VIN has 17 characters since 1981; this has 18.']],
    ['1J9RP1A36Ä164434*', ['A VIN has only digits and capital letters A to Z.']],
    ['QI', ['A VIN has 17 characters since 1981; this has 2.', 'A VIN never has the letters Q, I; look for 1 or 0.']],
  ])('warns of %s', (text, warnings) => {
    expect(valueOf(checkVin(text)).warnings).toEqual(warnings);
  });

  it('refuses only what is nothing to check', () => {
    for (const text of [
      '',
      '  ',
      '--',
      'x'.repeat(41),
      ...(NO_NUMBERS.filter((v) => typeof v !== 'string') as unknown as string[]),
    ])
      expectRefused(checkVin(text), 'vin');
  });

  it('never throws, and never blocks an odd text', () => {
    for (const text of ODD_TEXTS) expectSound(checkVin(text), /^vin$/);
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 40 }), (text) => {
        const check = checkVin(text);
        expectSound(check, /^vin$/);
        if (check.ok) expect(check.value.verdict === 'fits').toBe(check.value.warnings.length === 0);
      }),
    );
  });
});
