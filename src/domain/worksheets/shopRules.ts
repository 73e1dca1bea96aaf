import { fromBase, type Unit } from '../measure/convert';
import type { NumberField, QuantityField } from './fields';
import { readInputs, type Reading } from './readInputs';
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
export function readRule(
  rule: RuleOfThumb,
  raw: string | number,
  units: NonNullable<Reading['units']> = 'metric',
): ReadRule {
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
