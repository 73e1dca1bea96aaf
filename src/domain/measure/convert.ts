import { UNITS_BY_QUANTITY, type MeasuredQuantity } from './quantities';

/**
 * Every unit a limit may be written in, and the few more that a reader in inch units is shown or a worksheet takes.
 * Each factor takes one unit to the base unit of its kind (m, N, N·m, Pa, K, m³, kg, m³/s, kg/s, s,
 * V, A, Ω, degree, W, kg/J, kg/m³, m²/s). The bases are exact by definition: 1 in = 25.4 mm, 1 lb = 0.45359237 kg, g_n = 9.80665 m/s²,
 * 1 US gal = 231 in³, 1 imp gal = 4.54609 L. Source: NIST SP 811, appendix B.
 */
const INCH = 0.0254;
const POUND = 0.45359237;
const GRAVITY = 9.80665;
const POUND_FORCE = POUND * GRAVITY;
const LITRE = 1e-3;
/** Mechanical horsepower, 550 ft·lbf/s, in W. */
const HORSEPOWER = 550 * 12 * INCH * POUND_FORCE;

type Written = (typeof UNITS_BY_QUANTITY)[MeasuredQuantity][number];
/** Units of worksheets; no limit of a sheet is written in them. */
type WorksheetUnit = 'lb' | 'cm' | 'kgf·cm' | 'kW' | 'hp' | 'g/kWh' | 'lb/hp·h' | 'kg/m³' | 'g/cm³' | 'mm²/s';
export type Unit = Written | WorksheetUnit;

/** What a unit belongs to: a quantity of limits, or one that only worksheets reckon with. */
export type UnitQuantity = MeasuredQuantity | 'power' | 'fuel consumption' | 'density' | 'kinematic viscosity';

/** What a unit measures. Two flows: a volume and a mass in a time, joined only by a density. */
type Kind = Exclude<UnitQuantity, 'flow'> | 'volume flow' | 'mass flow';

interface Measure {
  kind: Kind;
  factor: number;
  /** Added in the base unit, for temperature scales: K = factor · value + offset. */
  offset?: number;
}

const MEASURES: Record<Unit, Measure> = {
  mm: { kind: 'length', factor: 1e-3 },
  µm: { kind: 'length', factor: 1e-6 },
  cm: { kind: 'length', factor: 1e-2 },
  in: { kind: 'length', factor: INCH },
  thou: { kind: 'length', factor: INCH / 1000 },
  '°': { kind: 'angle', factor: 1 },
  'N·m': { kind: 'torque', factor: 1 },
  'lbf·ft': { kind: 'torque', factor: POUND_FORCE * 12 * INCH },
  'lbf·in': { kind: 'torque', factor: POUND_FORCE * INCH },
  'kgf·m': { kind: 'torque', factor: GRAVITY },
  'kgf·cm': { kind: 'torque', factor: GRAVITY / 100 },
  N: { kind: 'force', factor: 1 },
  kN: { kind: 'force', factor: 1000 },
  lbf: { kind: 'force', factor: POUND_FORCE },
  kPa: { kind: 'pressure', factor: 1e3 },
  bar: { kind: 'pressure', factor: 1e5 },
  psi: { kind: 'pressure', factor: POUND_FORCE / INCH ** 2 },
  MPa: { kind: 'pressure', factor: 1e6 },
  '°C': { kind: 'temperature', factor: 1, offset: 273.15 },
  '°F': { kind: 'temperature', factor: 5 / 9, offset: 273.15 - (32 * 5) / 9 },
  mL: { kind: 'volume', factor: LITRE / 1000 },
  L: { kind: 'volume', factor: LITRE },
  'cm³': { kind: 'volume', factor: LITRE / 1000 },
  'US qt': { kind: 'volume', factor: (231 / 4) * INCH ** 3 },
  'imp qt': { kind: 'volume', factor: (4.54609 / 4) * LITRE },
  'cc/min': { kind: 'volume flow', factor: LITRE / 1000 / 60 },
  'mL/min': { kind: 'volume flow', factor: LITRE / 1000 / 60 },
  'L/min': { kind: 'volume flow', factor: LITRE / 60 },
  'lb/h': { kind: 'mass flow', factor: POUND / 3600 },
  'g/s': { kind: 'mass flow', factor: 1e-3 },
  rpm: { kind: 'speed', factor: 1 },
  s: { kind: 'time', factor: 1 },
  min: { kind: 'time', factor: 60 },
  h: { kind: 'time', factor: 3600 },
  V: { kind: 'voltage', factor: 1 },
  mV: { kind: 'voltage', factor: 1e-3 },
  A: { kind: 'current', factor: 1 },
  Ω: { kind: 'resistance', factor: 1 },
  kΩ: { kind: 'resistance', factor: 1000 },
  g: { kind: 'mass', factor: 1e-3 },
  kg: { kind: 'mass', factor: 1 },
  lb: { kind: 'mass', factor: POUND },
  '%': { kind: 'share', factor: 1 },
  ':1': { kind: 'ratio', factor: 1 },
  turns: { kind: 'count', factor: 1 },
  places: { kind: 'count', factor: 1 },
  drops: { kind: 'count', factor: 1 },
  kW: { kind: 'power', factor: 1000 },
  hp: { kind: 'power', factor: HORSEPOWER },
  'g/kWh': { kind: 'fuel consumption', factor: 1e-3 / 3.6e6 },
  'lb/hp·h': { kind: 'fuel consumption', factor: POUND / (HORSEPOWER * 3600) },
  'kg/m³': { kind: 'density', factor: 1 },
  'g/cm³': { kind: 'density', factor: 1000 },
  'mm²/s': { kind: 'kinematic viscosity', factor: 1e-6 },
};

/** Kinds that can stand below zero: a depth, a turn back, a gauge pressure under the air's, a share that fell. */
const SIGNED: readonly Kind[] = ['length', 'angle', 'force', 'pressure', 'temperature', 'voltage', 'current', 'share'];

export type Converted = { ok: true; value: number } | { ok: false; message: string };

const refuse = (message: string): Converted => ({ ok: false, message });

export const isUnit = (text: string): text is Unit => Object.hasOwn(MEASURES, text);

/** The quantity a unit belongs to: `'torque'` for `lbf·in`, `'flow'` for `lb/h`. */
export function quantityOf(unit: Unit): UnitQuantity {
  const { kind } = MEASURES[unit];
  return kind === 'volume flow' || kind === 'mass flow' ? 'flow' : kind;
}

/**
 * A value taken from one unit to another, not rounded. Refuses, in a sentence, what is no number, what cannot be
 * (a negative torque, less than absolute zero), units of different quantities, and a volume flow against a mass
 * flow without a density.
 *
 * @param density of the fluid in kg/m³; only used between cc/min, mL/min, L/min and lb/h, g/s
 */
export function convert(value: number, from: Unit, to: Unit, density?: number): Converted {
  if (!isUnit(from)) return refuse(`"${String(from)}" is no unit that the book knows.`);
  if (!isUnit(to)) return refuse(`"${String(to)}" is no unit that the book knows.`);
  if (!Number.isFinite(value)) return refuse(`The ${quantityOf(from)} must be a number.`);
  const a = MEASURES[from];
  const b = MEASURES[to];
  if (value < 0 && !SIGNED.includes(a.kind)) return refuse(`A ${quantityOf(from)} cannot be less than zero.`);
  const base = a.factor * value + (a.offset ?? 0);
  // The smallest slip of floating point below absolute zero is still absolute zero.
  if (a.kind === 'temperature' && base < -1e-9)
    return refuse('A temperature cannot be below absolute zero, −273.15 °C.');

  let across = 1;
  if (a.kind !== b.kind) {
    if (quantityOf(from) !== 'flow' || quantityOf(to) !== 'flow')
      return refuse(`${from} measures ${a.kind} and ${to} measures ${b.kind}; one cannot be turned into the other.`);
    if (density === undefined)
      return refuse(`${from} to ${to} needs the density of the fluid, because one is a volume and the other a mass.`);
    if (!(density > 0) || !Number.isFinite(density)) return refuse('The density must be more than zero, in kg/m³.');
    across = a.kind === 'volume flow' ? density : 1 / density;
  }
  if (from === to) return { ok: true, value };
  const result = (base * across - (b.offset ?? 0)) / b.factor;
  return Number.isFinite(result) ? { ok: true, value: result } : refuse(`The ${quantityOf(from)} is too large.`);
}

/** All units of the quantity that a unit belongs to, itself among them: the torques for `lbf·in`. */
export const unitsLike = (unit: Unit): Unit[] =>
  (Object.keys(MEASURES) as Unit[]).filter((other) => quantityOf(other) === quantityOf(unit));

/** A value in the base unit of its kind (m, N·m, Pa, K, m³/s …; % and turns as they are), not rounded. Refuses what `convert` refuses. */
export function toBase(value: number, unit: Unit): Converted {
  const checked = convert(value, unit, unit);
  if (!checked.ok) return checked;
  const { factor, offset = 0 } = MEASURES[unit];
  return { ok: true, value: factor * value + offset };
}

/** A value from the base unit of its kind in `unit`, not rounded. */
export const fromBase = (base: number, unit: Unit): number =>
  (base - (MEASURES[unit].offset ?? 0)) / MEASURES[unit].factor;

/** Whether two units measure the same kind of thing, so that one can be turned into the other without a density. */
export const sameKind = (a: Unit, b: Unit): boolean => MEASURES[a].kind === MEASURES[b].kind;
