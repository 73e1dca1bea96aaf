import { type Worked, refused, worked } from './worked';

/** Value of each letter; digits stand for themselves. I, O and Q are not used. Source: 49 CFR 565.15(c). */
const VALUES: Readonly<Record<string, number>> = {
  ...Object.fromEntries([...'0123456789'].map((digit) => [digit, Number(digit)])),
  ...Object.fromEntries([...'ABCDEFGH'].map((letter, i) => [letter, i + 1])),
  ...Object.fromEntries([...'JKLMN'].map((letter, i) => [letter, i + 1])),
  ...{ P: 7, R: 9 },
  ...Object.fromEntries([...'STUVWXYZ'].map((letter, i) => [letter, i + 2])),
};

/** Weight of each of the 17 places; the ninth is the check digit itself. Source: 49 CFR 565.15(c). */
const WEIGHTS = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];
const LENGTH = WEIGHTS.length;
const CHECK_PLACE = 8;

export interface VinCheck {
  /** Capital letters, without spaces and hyphens. */
  vin: string;
  /** 'not checked' where length or letters leave nothing to reckon with. */
  verdict: 'fits' | 'does not fit' | 'not checked';
  /** The check digit that the other sixteen ask for; null where they cannot be reckoned with. */
  expected: string | null;
  /** Sum of value times weight over all places, of which `expected` is the rest after division by 11; null like it. */
  sum: number | null;
  /** Whole sentences: why to look again. Empty where the digit fits. Never a reason to refuse the number. */
  warnings: string[];
}

/** What a check digit that fits is worth. */
export const FITS_IS_NO_PROOF =
  'A digit that fits rules out most slips, not all: A and J, for example, count the same.';
const ONLY_NORTH_AMERICA = 'Vehicles made for other markets than North America need not have a check digit.';

const letters = (list: readonly string[]) => (list.length === 1 ? `letter ${list[0]}` : `letters ${list.join(', ')}`);

/** Whatever is in the number that cannot be: too many characters, too few, the three letters, other signs. */
function misfits(vin: string): string[] {
  const found = [...new Set(vin)].filter((sign) => !Object.hasOwn(VALUES, sign));
  const forbidden = found.filter((sign) => 'IOQ'.includes(sign));
  const count = [...vin].length;
  return [
    ...(count === LENGTH ? [] : [`A VIN has 17 characters since 1981; this has ${count}.`]),
    ...(forbidden.length > 0 ? [`A VIN never has the ${letters(forbidden)}; look for 1 or 0.`] : []),
    ...(found.length > forbidden.length ? ['A VIN has only digits and capital letters A to Z.'] : []),
  ];
}

/**
 * Checks the ninth character of a vehicle identification number against the other sixteen. It warns and never blocks:
 * the digit is only obligatory in North America (from memory), and older numbers are shorter.
 *
 * @param text as read from the plate; small letters, spaces and hyphens do not matter
 * @returns a problem of `vin` only where there is nothing to check: no text, or more than 40 characters
 *
 * Source: 49 CFR 565.15(c), tables as in the older identical section.
 */
export function checkVin(text: string): Worked<VinCheck> {
  const because = (message: string) => refused({ field: 'vin', message });
  if (typeof text !== 'string') return because('The VIN must be text.');
  const vin = text.toUpperCase().replace(/[\s-]/g, '');
  if (vin === '') return because('The VIN is missing; it has 17 characters.');
  if (text.length > 40) return because('The VIN is far too long; it has 17 characters.');

  const warnings = misfits(vin);
  if (warnings.length > 0) return worked({ vin, verdict: 'not checked', expected: null, sum: null, warnings });
  const sum = WEIGHTS.reduce((total, weight, i) => total + weight * (VALUES[vin[i] ?? ''] ?? 0), 0);
  const expected = sum % 11 === 10 ? 'X' : String(sum % 11);
  const found = vin[CHECK_PLACE];
  if (found === expected) return worked({ vin, verdict: 'fits', expected, sum, warnings });
  return worked({
    vin,
    verdict: 'does not fit',
    expected,
    sum,
    warnings: [
      `The ninth character is ${found}, but the others ask for ${expected}. Read the number again. ${ONLY_NORTH_AMERICA}`,
    ],
  });
}
