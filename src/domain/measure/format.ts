import { convert, type Unit } from './convert';
import { decimalsOf, roundTo } from './round';

/** The same value as a reader in metric and a reader in inch units see it. */
export interface BothUnits {
  metric: string;
  inch: string;
}

/** Several values that belong together (a minimum and a maximum, a torque and its tolerance): one unit, one fineness. */
export interface Texts {
  numbers: string[];
  unit: Unit;
}

const MINUS = '\u2212';
/** Narrow no-break space: groups of three from five digits on, as the SI Brochure (9th ed., 5.4.4) writes them. */
const GROUP = '\u202f';

/**
 * A number as it is printed: a true minus, a point, thin groups from five digits on, no exponent
 * (below 10^21, far beyond what a sheet may state).
 *
 * @param decimals places after the point; as many as the number has where left out
 */
export function formatNumber(value: number, decimals?: number): string {
  if (!Number.isFinite(value)) throw new RangeError('The value to show must be a number.');
  const places = Math.min(decimals ?? decimalsOf(value), 20);
  const rounded = decimals === undefined ? Math.abs(value) : roundTo(Math.abs(value), 10 ** -places);
  const [whole = '0', fraction] = rounded.toFixed(places).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, GROUP) : whole;
  const text = fraction ? `${grouped}.${fraction}` : grouped;
  return value < 0 && /[1-9]/.test(text) ? MINUS + text : text;
}

/** "10 N·m", "90°", "9.5:1": the space that the unit takes. The page keeps number and unit on one line. */
export function withUnit(number: string, unit: Unit): string {
  return unit === '°' || unit === ':1' ? number + unit : `${number} ${unit}`;
}

/** Torques of less than this are read on a wrench in lbf·in; 27 N·m. Common practice, no source. */
const POUND_FEET_FROM = 20;

/** What a reader in inch units reads a value of that size in. */
export function inchUnit(unit: Unit, largest: number): Unit {
  if (unit === 'N·m' || unit === 'kgf·m' || unit === 'kgf·cm') {
    const feet = convert(largest, unit, 'lbf·ft');
    return feet.ok && feet.value >= POUND_FEET_FROM ? 'lbf·ft' : 'lbf·in';
  }
  // cc, mL, cc/min and grams stay: burettes, flow benches and piston scales carry them everywhere (common practice).
  const other: Partial<Record<Unit, Unit>> = {
    mm: 'in',
    cm: 'in',
    µm: 'in',
    N: 'lbf',
    kN: 'lbf',
    kPa: 'psi',
    bar: 'psi',
    MPa: 'psi',
    '°C': '°F',
    L: 'US qt',
    'imp qt': 'US qt',
    kg: 'lb',
    'g/s': 'lb/h',
    kW: 'hp',
    'g/kWh': 'lb/hp·h',
  };
  return other[unit] ?? unit;
}

const METRIC_UNIT: Partial<Record<Unit, Unit>> = {
  in: 'mm',
  thou: 'mm',
  'lbf·ft': 'N·m',
  'lbf·in': 'N·m',
  'kgf·m': 'N·m',
  'kgf·cm': 'N·m',
  lbf: 'N',
  psi: 'kPa',
  '°F': '°C',
  'US qt': 'L',
  'imp qt': 'L',
  lb: 'kg',
  'lb/h': 'g/s',
  hp: 'kW',
  'lb/hp·h': 'g/kWh',
};

/** The step a converted value is shown to where no tool is named: never worse than about 1.3 % of a value from 4 up, 2.5 % in lbf·in. */
function sensibleStep(unit: Unit, largest: number): number {
  if (unit === 'in') return largest < 1 ? 1e-4 : 1e-3;
  if (unit === 'mm') return 1e-3;
  if (unit === '°F' || unit === '°C') return 1;
  if (largest < 1) return 0.01;
  if (largest < 20) return 0.1;
  if (unit === 'lbf·in') return 1;
  return largest < 50 ? 0.5 : 1;
}

/** The decade at or below the tool's own resolution, but no finer than a tool in that unit can show. */
function stepLike(resolution: number, from: Unit, to: Unit): number {
  // A resolution is a difference, so a temperature's must not be moved by the offset of its scale.
  const one = convert(1, from, to);
  const none = convert(0, from, to);
  if (!one.ok || !none.ok) return resolution;
  const exponent = Math.floor(Math.log10(resolution * Math.abs(one.value - none.value)) + 1e-9);
  return Number(`1e${Math.max(exponent, to === 'in' ? -4 : to === 'mm' ? -3 : -6)}`);
}

function written(values: readonly number[], unit: Unit, resolution: number | undefined, stated: boolean): Texts {
  const own = Math.max(0, ...values.map((value) => decimalsOf(value)));
  const tool = resolution === undefined ? own : decimalsOf(resolution);
  const places = stated ? Math.max(own, tool) : tool;
  const shown = resolution === undefined || stated ? values : values.map((value) => roundTo(value, resolution));
  return { numbers: shown.map((value) => formatNumber(value, places)), unit };
}

function converted(
  values: readonly number[],
  from: Unit,
  to: Unit,
  resolution: number | undefined,
  stated: boolean,
): Texts {
  const results = values.map((value) => convert(value, from, to));
  const exact = results.flatMap((result) => (result.ok ? [result.value] : []));
  // What cannot be converted (colder than absolute zero) is shown as it was written; the check of the text speaks up.
  if (to === from || exact.length < values.length) return written(values, from, resolution, stated);
  const step =
    resolution === undefined ? sensibleStep(to, Math.max(0, ...exact.map(Math.abs))) : stepLike(resolution, from, to);
  const rounded = exact.map((value) => roundTo(value, step));
  // A half step is a place on a scale, not a claim of tenths: 22 and 22.5, but 0.0160 where thousandths are read.
  const places = step === 0.5 ? undefined : decimalsOf(step);
  return { numbers: rounded.map((value) => formatNumber(value, places)), unit: to };
}

/**
 * Values that stand together, in both unit systems. Each text is made from the stored value in one rounding.
 * As written, a value keeps its digits, or its tool's where a resolution is known; converted, it gets the digits of a
 * like tool (0.01 mm reads as 0.0001 in), or sensible ones.
 *
 * @param values in `unit`, finite
 * @param resolution of the tool, in `unit`
 * @param stated true for a value that a sheet states: in its own unit it is never rounded, or a limit of 0.015 mm
 *   read in steps of 0.002 mm would be printed as 0.016 mm
 */
export function inBothUnits(
  values: readonly number[],
  unit: Unit,
  resolution?: number,
  stated = false,
): { metric: Texts; inch: Texts } {
  const largest = Math.max(0, ...values.map(Math.abs));
  return {
    metric: converted(values, unit, METRIC_UNIT[unit] ?? unit, resolution, stated),
    inch: converted(values, unit, inchUnit(unit, largest), resolution, stated),
  };
}

/** One value in both unit systems: `formatMeasure(10, 'N·m')` is 10 N·m and 89 lbf·in. */
export function formatMeasure(value: number, unit: Unit, resolution?: number): BothUnits {
  const { metric, inch } = inBothUnits([value], unit, resolution);
  return { metric: withUnit(metric.numbers[0] ?? '', metric.unit), inch: withUnit(inch.numbers[0] ?? '', inch.unit) };
}
