import { lowered } from '../wording';
import { numberProblem, work, type Bounds, type FieldProblem, type Worked } from './worked';

/** A limit in the base unit of what it limits (m, Pa, m³/s, per cent). One side may be open, never both. */
export interface Band {
  min?: number;
  max?: number;
}

export interface Judged {
  at: 'in' | 'under' | 'over';
  /** How far past the limit, in the unit of the value; 0 where the value is in. */
  by: number;
}

/** No bench reads a thousand-millionth part; it only keeps 0.0016 in and 0.04064 mm on the same side of a limit. */
const NEGLIGIBLE = 1e-9;

/** Whether two lengths, flows or pressures differ by no more than conversion and subtraction leave behind. */
export const sameWithin = (a: number, b: number, size = 0): boolean =>
  Math.abs(a - b) <= NEGLIGIBLE * Math.max(Math.abs(a), Math.abs(b), Math.abs(size));

/**
 * What is wrong with a limit: no side given, a side that is no number or out of bounds, or the sides the wrong way round.
 */
export function bandProblems(field: string, called: string, band: Band, bounds: Bounds = {}): FieldProblem[] {
  const { min, max } = band ?? {};
  if (min === undefined && max === undefined)
    return [{ field, message: `${called} must have a least or a greatest value.` }];
  const problems = [
    ...(min === undefined ? [] : numberProblem(`${field}.min`, `The least of ${lowered(called)}`, min, bounds)),
    ...(max === undefined ? [] : numberProblem(`${field}.max`, `The greatest of ${lowered(called)}`, max, bounds)),
  ];
  if (problems.length === 0 && min !== undefined && max !== undefined && min > max)
    return [{ field: `${field}.max`, message: `The greatest of ${lowered(called)} cannot be less than its least.` }];
  return problems;
}

/** As `bandProblems`, for a limit that may be left out because nothing is judged. */
export const optionalBandProblems = (
  field: string,
  called: string,
  band: Band | undefined,
  bounds: Bounds,
): FieldProblem[] => (band === undefined ? [] : bandProblems(field, called, band, bounds));

/**
 * Where a value that was already checked lies; for use inside a computation that checks its input. A value that is
 * no number is never `in`, and its `by` is no number either, so that `work` refuses it.
 *
 * @param size of the readings that the value is a difference of, in its unit. A clearance of 0.03 mm between 52 mm
 *   diameters carries the rounding of 52 mm, which the width of the limit alone would not forgive.
 */
export function placeIn(value: number, { min, max }: Band, size = 0): Judged {
  const slack = (limit: number) => NEGLIGIBLE * Math.max(Math.abs(limit), Math.abs(size));
  if (min !== undefined && !(value >= min - slack(min))) return { at: 'under', by: min - value };
  if (max !== undefined && !(value <= max + slack(max))) return { at: 'over', by: value - max };
  return { at: 'in', by: 0 };
}

/** Judged where there is a limit to judge by, else null. */
export const placeInIfAny = (value: number, band: Band | undefined, size = 0): Judged | null =>
  band === undefined ? null : placeIn(value, band, size);

/** True unless a judgement says otherwise; what was not judged did not fail. */
export const nothingFails = (judged: readonly (Judged | null)[]): boolean =>
  judged.every((one) => one === null || one.at === 'in');

/**
 * Where a value lies against a limit: `in`, `under` or `over`, and by how much. A value on the limit is in, also
 * where unit conversion has moved it by a part in 10⁹ of the limit.
 *
 * Errors: `value` no number; `band` without a side, or with its sides the wrong way round.
 */
export const judge = (value: number, band: Band): Worked<Judged> =>
  work([...numberProblem('value', 'The value', value), ...bandProblems('band', 'The limit', band)], 'value', () =>
    placeIn(value, band),
  );

/**
 * The limit that lies the same share to both sides of a nominal value: 250 cc/min ± 3 % is 242.5 to 257.5.
 *
 * @param percent 0 to 100
 */
export const bandAround = (nominal: number, percent: number): Worked<Band> =>
  work(
    [
      ...numberProblem('nominal', 'The nominal value', nominal, { above: 0 }),
      ...numberProblem('percent', 'The tolerance', percent, { least: 0, most: 100, say: (bound) => `${bound} %` }),
    ],
    'nominal',
    () => ({ min: nominal * (1 - percent / 100), max: nominal * (1 + percent / 100) }),
  );
