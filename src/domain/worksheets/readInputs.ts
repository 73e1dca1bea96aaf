import { nameInside } from '../wording';
import { convert, fromBase, sameKind, toBase, type Unit } from '../measure/convert';
import { formatMeasure, formatNumber, inchUnit, withUnit, type BothUnits } from '../measure/format';
import { sameWithin } from '../measure/band';
import { needsDensity, readBare, readTyped } from '../measure/read';
import { refused, worked, type FieldProblem, type Worked } from '../measure/worked';
import type {
  BandField,
  ChoiceField,
  Column,
  Field,
  Fields,
  NumberField,
  QuantityField,
  RowsField,
  TextField,
  Values,
} from './fields';

/** Inputs before anybody has read them: numbers or texts under the fields' names, bands as `{min, max}`, rows as lists. */
export type RawInputs = Readonly<Record<string, unknown>>;

/** What a shop has set for its rules of thumb, in the fields' units; the usual values stand where it has set none. */
export type ShopRules = Readonly<Record<string, number>>;

export interface Reading {
  /** Unit system of bare numbers: that of the reader's screen. The API always means metric. */
  units?: 'metric' | 'inch';
  rules?: ShopRules;
}

/** The unit of a bare number in a box: `mm`, or `in` for a reader in inch units. */
export const boxUnit = (unit: Unit, units: 'metric' | 'inch'): Unit =>
  units === 'metric' ? unit : inchUnit(unit, 1e9);

interface Desk extends Required<Reading> {
  problems: FieldProblem[];
  /** How each text was understood, by the path of its box. */
  understood: Record<string, BothUnits>;
  /** kg/m³ by the name of the field that holds it. */
  densities: Map<string, number>;
}

const isBlank = (raw: unknown): boolean =>
  raw === undefined || raw === null || (typeof raw === 'string' && raw.trim() === '');

/**
 * Reads raw inputs into what `compute` takes. Every box that cannot be read is a problem with its path
 * (`injectors.2.before`); `understood` says of each text how it was taken, also where another box has a problem.
 */
export function readInputs<F extends Fields>(
  fields: F,
  raw: RawInputs,
  { units = 'metric', rules = {} }: Reading = {},
): { inputs: Worked<Values<F>>; understood: Record<string, BothUnits> } {
  const desk: Desk = { units, rules, problems: [], understood: {}, densities: new Map() };
  const values: Record<string, unknown> = {};
  const entries = Object.entries(fields).sort(
    ([, a], [, b]) => Number(b.type === 'number') - Number(a.type === 'number'),
  );
  // Numbers first: a density among them says how a flow in lb/h is read.
  for (const [name, field] of entries) {
    values[name] = readField(field, name, field.label, raw[name], desk);
    if (field.type === 'number' && typeof values[name] === 'number') desk.densities.set(name, values[name]);
  }
  const inputs = desk.problems.length > 0 ? refused(...desk.problems) : worked(values as Values<F>);
  return { inputs, understood: desk.understood };
}

function readField(field: Field, path: string, called: string, raw: unknown, desk: Desk): unknown {
  if (field.type === 'rows') return readRows(field, path, raw, desk);
  if (field.type === 'band') return readBand(field, path, called, raw, desk);
  return readColumn(field, path, called, raw, desk);
}

function readColumn(field: Column, path: string, called: string, raw: unknown, desk: Desk): unknown {
  if (isBlank(raw)) {
    const usual = 'usual' in field ? (field.usual as string | number | undefined) : undefined;
    if (field.type === 'choice' && !field.optional) return usual ?? field.options[0]?.value;
    if (usual !== undefined && field.type === 'quantity') return baseOf(desk.rules[path] ?? Number(usual), field.unit);
    if (usual !== undefined) return desk.rules[path] ?? usual;
    if (!field.optional) desk.problems.push({ field: path, message: `${called} is missing.` });
    return undefined;
  }
  switch (field.type) {
    case 'quantity':
      return readQuantity(field, path, called, raw, desk);
    case 'number':
      return readNumber(field, path, called, raw, desk);
    case 'choice':
      return readChoice(field, path, called, raw, desk);
    case 'text':
      return readText(field, path, called, raw, desk);
  }
}

const baseOf = (value: number, unit: Unit): number | undefined => {
  const base = toBase(value, unit);
  return base.ok ? base.value : undefined;
};

/** What of a field decides how a measure in it is read; the end of a band has neither bounds nor a density. */
type Measured = Pick<QuantityField, 'unit' | 'above' | 'least' | 'most' | 'density'>;

function readQuantity(field: Measured, path: string, called: string, raw: unknown, desk: Desk): number | undefined {
  const say = (message: string) => void desk.problems.push({ field: path, message });
  const typed =
    typeof raw === 'number'
      ? readTyped(Number.isFinite(raw) ? String(raw) : '', field.unit)
      : readTyped(String(raw), boxUnit(field.unit, desk.units));
  if (!typed.ok) return say(`${called}: ${typed.message}`);
  let { base } = typed.value;
  const { amount, unit } = typed.value;
  if (needsDensity(typed.value, field.unit)) {
    const across = convert(amount, unit, field.unit, desk.densities.get(field.density ?? ''));
    if (!across.ok) return say(`${called}: ${across.message}`);
    base = baseOf(across.value, field.unit) ?? base;
  }
  if (!Number.isFinite(fromBase(base, field.unit))) return say(`${called} is too large.`);
  desk.understood[path] = understood(amount, unit, base, field.unit);
  const value = Number(fromBase(base, field.unit).toPrecision(12));
  const wrong = outside(value, field, (bound) => withUnit(formatNumber(bound), field.unit));
  return wrong ? say(`${called} ${wrong}.`) : base;
}

/** "0.014 in" and "0.356 mm" for what was typed as `.014"`: as it was typed in the one system, converted in the other. */
function understood(amount: number, unit: Unit, base: number, fieldUnit: Unit): BothUnits {
  const typed = Number(amount.toPrecision(12));
  const both = withoutTail(formatMeasure(typed, unit));
  if (sameKind(unit, fieldUnit) && both.metric !== both.inch) return both;
  const inField = withUnit(formatNumber(Number(fromBase(base, fieldUnit).toPrecision(4))), fieldUnit);
  if (unit === fieldUnit || inField === both.metric) return both;
  // Mass taken for volume: what came of it says more than the same mass in another unit.
  return { metric: inField, inch: sameKind(unit, fieldUnit) ? inField : withUnit(formatNumber(typed), unit) };
}

/** "254 mm" rather than "254.000 mm" for 10 in: what was read is no claim to a fineness. */
const withoutTail = ({ metric, inch }: BothUnits): BothUnits => {
  const bare = (text: string) => text.replace(/(\.\d*?)0+(?=\D|$)/, (_, kept: string) => (kept === '.' ? '' : kept));
  return { metric: bare(metric), inch: bare(inch) };
};

function outside(
  value: number,
  { above, least, most }: Pick<QuantityField, 'above' | 'least' | 'most'>,
  write: (bound: number) => string,
): string | null {
  if (above !== undefined && value <= above)
    return above === 0 ? 'must be more than zero' : `must be more than ${write(above)}`;
  if (least !== undefined && value < least)
    return least === 0 ? 'cannot be less than zero' : `must be ${write(least)} or more`;
  if (most !== undefined && value > most) return `must be ${write(most)} or less`;
  return null;
}

function readNumber(field: NumberField, path: string, called: string, raw: unknown, desk: Desk): number | undefined {
  const say = (message: string) => void desk.problems.push({ field: path, message });
  const text = String(raw).trim();
  const { after } = field;
  const read =
    typeof raw === 'number'
      ? ({ ok: true, value: raw } as const)
      : readBare(after && text.endsWith(after) ? text.slice(0, -after.length) : text);
  if (!read.ok) return say(`${called}: ${read.message}`);
  const { value } = read;
  const wrong = !Number.isFinite(value)
    ? 'must be a number'
    : field.whole && !Number.isInteger(value)
      ? 'must be a whole number'
      : outside(value, field, (bound) => formatNumber(bound));
  return wrong ? say(`${called} ${wrong}.`) : value;
}

function readChoice(field: ChoiceField, path: string, called: string, raw: unknown, desk: Desk): string | undefined {
  const found = field.options.find(({ value }) => value === raw);
  if (found) return found.value;
  const list = field.options.map(({ value }) => value).join(', ');
  desk.problems.push({ field: path, message: `${called} must be one of ${list}.` });
  return undefined;
}

function readText(field: TextField, path: string, called: string, raw: unknown, desk: Desk): string | undefined {
  const text = typeof raw === 'string' ? raw.trim() : String(raw);
  if (text.length <= field.most) return text;
  desk.problems.push({ field: path, message: `${called} must be ${field.most} characters or fewer.` });
  return undefined;
}

function readBand(field: BandField, path: string, called: string, raw: unknown, desk: Desk): unknown {
  const { min, max } = (typeof raw === 'object' && raw !== null ? raw : {}) as { min?: unknown; max?: unknown };
  if (isBlank(min) && isBlank(max)) {
    if (!field.optional)
      desk.problems.push({ field: `${path}.min`, message: `${called}: give the least, the most, or both.` });
    return field.optional ? undefined : {};
  }
  const end = (value: unknown, which: 'min' | 'max') =>
    isBlank(value)
      ? undefined
      : readQuantity(
          { unit: field.unit },
          `${path}.${which}`,
          `${called}, ${which === 'min' ? 'least' : 'most'}`,
          value,
          desk,
        );
  const low = end(min, 'min');
  let high = end(max, 'max');
  if (low !== undefined && high !== undefined && low > high) {
    // The same limit in two units differs by a slip of floating point, and is no mistake.
    if (sameWithin(low, high)) high = low;
    else desk.problems.push({ field: `${path}.max`, message: `${called}: the most is less than the least.` });
  }
  return { ...(low !== undefined && { min: low }), ...(high !== undefined && { max: high }) };
}

/** Whether a row holds nothing that was typed; a choice alone does not fill one, because a form always shows one chosen. */
const isEmptyRow = (columns: RowsField['columns'], raw: unknown): boolean =>
  typeof raw !== 'object' ||
  raw === null ||
  Object.entries(columns).every(([name, { type }]) => type === 'choice' || isBlank((raw as RawInputs)[name]));

function readRows(field: RowsField, path: string, raw: unknown, desk: Desk): unknown[] {
  const given: unknown[] = Array.isArray(raw) ? raw : [];
  // Empty rows at the end were never filled in. One in the middle is a reading that is missing: what follows keeps its number.
  let filled = given.length;
  while (filled > 0 && isEmptyRow(field.columns, given[filled - 1])) filled--;
  if (filled < field.least)
    desk.problems.push({
      field: `${path}.${filled}.${Object.keys(field.columns)[0] ?? ''}`,
      message: `${field.label}: fill in at least ${field.least === 1 ? 'one' : String(field.least)}.`,
    });
  if (filled > field.most) desk.problems.push({ field: path, message: `${field.label}: ${field.most} at most.` });
  return given.slice(0, Math.min(filled, field.most)).map((row, i) => {
    const cells = (typeof row === 'object' && row !== null ? row : {}) as RawInputs;
    return Object.fromEntries(
      Object.entries(field.columns).map(([name, column]) => [
        name,
        readColumn(
          column,
          `${path}.${i}.${name}`,
          `${field.item} ${i + 1}, ${nameInside(column.label)}`,
          cells[name],
          desk,
        ),
      ]),
    );
  });
}
