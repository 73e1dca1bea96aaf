import { convert, quantityOf, unitsLike } from '../../measure/convert';
import { formatNumber, withUnit } from '../../measure/format';
import { readAny } from '../../measure/read';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';

/** Digits that a converted value is shown with: what a bench can use, and enough to go back without a visible loss. */
const DIGITS = 6;

/** One measure in every unit of its kind. Source of the factors: `measure/convert.ts`. */
export function compute({ measure, density }: Values<typeof fields>): Worked<Outcome> {
  const read = readAny(measure);
  if (!read.ok) return refused({ field: 'measure', message: read.message });
  const { amount, unit } = read.value;
  const results: Result[] = [];
  for (const to of unitsLike(unit)) {
    const found = convert(amount, unit, to, density);
    // A mass flow has no volume flow without a density; the units that need none are still shown.
    if (!found.ok || to === unit) continue;
    const shown = withUnit(formatNumber(Number(found.value.toPrecision(DIGITS))), to);
    results.push({ key: to, label: to, value: found.value, unit: to, text: { metric: shown, inch: shown } });
  }
  const typed = withUnit(formatNumber(Number(amount.toPrecision(12))), unit);
  const reasons = [
    results.length > 0
      ? `${typed}, in the other units of ${quantityOf(unit)}.`
      : `${unit} is the only unit of ${quantityOf(unit)} that the book keeps.`,
  ];
  return worked({
    verdict: 'none',
    reasons: reasons.map((reason) => ({ metric: reason, inch: reason })),
    results,
    charts: [],
  });
}
