/** What a computation answers: its value, or what is wrong with the input, field by field. */

export interface FieldProblem {
  /** Name of the input, with its place in a list or row: `nominal`, `readings.2`, `bore.top.0`. */
  field: string;
  /** A whole sentence that names the input in words: "The bore must be more than zero." */
  message: string;
}

export type Worked<T> = { ok: true; value: T } | { ok: false; problems: FieldProblem[] };

export const worked = <T>(value: T): Worked<T> => ({ ok: true, value });
export const refused = (...problems: FieldProblem[]): { ok: false; problems: FieldProblem[] } => ({
  ok: false,
  problems,
});

export interface Bounds {
  /** Must be more than this. */
  above?: number;
  /** Must be this or more. */
  least?: number;
  /** Must be this or less. */
  most?: number;
  /** How a bound is written out in the sentence, for values that people do not read in SI: `(v) => "5 mm"`. */
  say?: (bound: number) => string;
}

/**
 * The problem of one number, or none: not a finite number, or outside its bounds.
 *
 * @param called the input in words, with its article: "The bore", "Reading 3"
 */
export function numberProblem(
  field: string,
  called: string,
  value: unknown,
  { above, least, most, say = String }: Bounds = {},
): FieldProblem[] {
  const because = (message: string) => [{ field, message: `${called} ${message}.` }];
  if (typeof value !== 'number' || !Number.isFinite(value)) return because('must be a number');
  if (above !== undefined && value <= above)
    return because(above === 0 ? 'must be more than zero' : `must be more than ${say(above)}`);
  if (least !== undefined && value < least)
    return because(least === 0 ? 'cannot be less than zero' : `must be ${say(least)} or more`);
  if (most !== undefined && value > most) return because(`must be ${say(most)} or less`);
  return [];
}

/**
 * Works a value out where no input has a problem and the answer is one a bench can show; enormous inputs can
 * overflow although each of them is a number.
 *
 * @param field the input to name where the answer overflows
 */
export function work<T>(problems: readonly FieldProblem[], field: string, compute: () => T): Worked<T> {
  if (problems.length > 0) return refused(...problems);
  const value = compute();
  return allFinite(value)
    ? worked(value)
    : refused({ field, message: 'These values are too large or too small to work with.' });
}

function allFinite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value);
  if (Array.isArray(value)) return value.every(allFinite);
  return value === null || typeof value !== 'object' || Object.values(value).every(allFinite);
}
