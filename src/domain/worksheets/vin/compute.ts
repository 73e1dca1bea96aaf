import { said } from '../../measure/said';
import { checkVin, FITS_IS_NO_PROOF, type VinCheck } from '../../measure/vin';
import { type Worked, worked } from '../../measure/worked';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';

const SOURCE = 'US 49 CFR 565.15(c)';

function results({ expected, sum }: VinCheck): Result[] {
  if (expected === null || sum === null) return [];
  return [
    {
      key: 'check-digit',
      label: 'Ninth character that the others ask for',
      value: null,
      unit: null,
      text: said`${expected}`,
      formula: said`Value times weight, all places added: ${sum} = ${Math.floor(sum / 11)} · 11 + ${sum % 11}${expected === 'X' ? ', and 10 is written X' : ''}`,
      source: SOURCE,
      main: true,
    },
  ];
}

/** Whether the check digit of a vehicle number fits the rest. It warns and never refuses a number that is there. */
export function compute({ vin }: Values<typeof fields>): Worked<Outcome> {
  const check = checkVin(vin);
  if (!check.ok) return check;
  const { verdict, warnings } = check.value;
  const reasons = verdict === 'fits' ? [`The check digit of ${check.value.vin} fits. ${FITS_IS_NO_PROOF}`] : warnings;
  return worked({
    verdict: verdict === 'fits' ? 'none' : 'look',
    reasons: reasons.map((reason) => said`${reason}`),
    results: results(check.value),
    charts: [],
  });
}
