import { convert, fromBase, type Unit } from '../measure/convert';
import { formatMeasure, formatNumber } from '../measure/format';
import type { NumberField, QuantityField } from './fields';
import { boxUnit, readInputs } from './readInputs';
import { WORKSHEETS } from './registry';
import type { Worksheet } from './worksheet';

/** A field that has no standard behind it: it stands at what is usual in the trade until a shop sets its own. */
export interface RuleOfThumb {
  /** `injector-set.deviation`: what settings and the API call it. */
  name: string;
  worksheet: { name: string; title: string };
  /** Name of the field in its worksheet. */
  field: string;
  label: string;
  hint: string | undefined;
  /** Of `usual`, the bounds and what a shop sets; null for a plain number. */
  unit: Unit | null;
  /** Printed after a plain number: "kg/m³". */
  after: string | undefined;
  usual: number;
  above: number | undefined;
  least: number | undefined;
  most: number | undefined;
}

type Units = 'metric' | 'inch';
type Settable = (QuantityField | NumberField) & { usual: number };

const settable = (field: Worksheet['fields'][string] | undefined): Settable | null =>
  (field?.type === 'quantity' || field?.type === 'number') && field.usual !== undefined ? (field as Settable) : null;

/** All rules of thumb, worksheet by worksheet in the order of the handbook. A column of a list is never one. */
export function rulesOf(worksheets: readonly Worksheet[] = WORKSHEETS): RuleOfThumb[] {
  return worksheets.flatMap(({ name, title, fields }) =>
    Object.entries(fields).flatMap(([key, described]): RuleOfThumb[] => {
      const field = settable(described);
      if (!field) return [];
      const { label, hint, usual, above, least, most } = field;
      const unit = field.type === 'quantity' ? field.unit : null;
      const after = field.type === 'number' ? field.after : undefined;
      const worksheet = { name, title };
      return [{ name: `${name}.${key}`, worksheet, field: key, label, hint, unit, after, usual, above, least, most }];
    }),
  );
}

/** A value for a rule, in its unit; or why it cannot be one, in the words of its box. */
export type ReadRule = { ok: true; value: number } | { ok: false; message: string };

/**
 * Reads what somebody set for a rule: a number in its unit, or a text in any unit of the kind. The bounds are those of
 * the field. An empty text is for the caller: it means what is usual.
 */
export function readRule(rule: RuleOfThumb, raw: string | number, units: Units = 'metric'): ReadRule {
  const { field, unit, label } = rule;
  const bounds = Object.fromEntries(
    (['above', 'least', 'most'] as const).flatMap((end) => (rule[end] === undefined ? [] : [[end, rule[end]]])),
  );
  const described: QuantityField | NumberField = unit
    ? { type: 'quantity', unit, label, optional: false, ...bounds }
    : { type: 'number', whole: false, label, optional: false, ...(rule.after ? { after: rule.after } : {}), ...bounds };
  const { inputs } = readInputs({ [field]: described }, { [field]: raw }, { units });
  if (!inputs.ok) return { ok: false, message: inputs.problems[0]?.message ?? `${label} cannot be read.` };
  const base = Number(inputs.value[field]);
  // Twelve digits: more than any tool, fewer than the slips of binary numbers.
  return { ok: true, value: Number((unit ? fromBase(base, unit) : base).toPrecision(12)) };
}

type Measured = Pick<RuleOfThumb, 'unit' | 'after'>;

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
