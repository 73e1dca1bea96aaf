import { convert, type Unit } from '../measure/convert';
import { formatMeasure, formatNumber } from '../measure/format';
import { boxUnit } from './readInputs';

/** Values of rules of thumb as people read and type them. Values are in the unit of the rule. */

type Units = 'metric' | 'inch';
interface Measured {
  /** null for a plain number. */
  unit: Unit | null;
  /** Printed after a plain number. */
  after?: string | undefined;
}

/** A value of a rule with its unit, for somebody to read: "3 %", "0.0020 in", "745 kg/m³". */
export function ruleWords({ unit, after }: Measured, value: number, units: Units): string {
  if (unit) return formatMeasure(value, unit)[units];
  return after ? `${formatNumber(value)} ${after}` : formatNumber(value);
}

/** What stands after the box of a rule; undefined for a plain number. */
export const ruleUnit = ({ unit, after }: Measured, units: Units): string | undefined =>
  unit ? boxUnit(unit, units) : after;

/** A value of a rule as its box shows it: in the unit of the box, with four digits where that is another; empty where none is set. */
export function ruleText({ unit }: Measured, value: number | null, units: Units): string {
  if (value === null) return '';
  const to = unit && boxUnit(unit, units);
  const shown = unit && to && to !== unit ? convert(value, unit, to) : null;
  return formatNumber(shown?.ok ? Number(shown.value.toPrecision(4)) : value);
}
