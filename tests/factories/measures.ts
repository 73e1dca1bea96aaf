import fc from 'fast-check';
import type { Worked } from '@/domain/measure/worked';

/** The value of a computation that must succeed; what was wrong in its own words where it did not. */
export function valueOf<T>(result: Worked<T>): T {
  if (!result.ok) throw new Error(result.problems.map(({ field, message }) => `${field}: ${message}`).join(' '));
  return result.value;
}

/** Any number between two, ends included, never −0. */
export const between = (min: number, max: number) =>
  fc.double({ min, max, noNaN: true }).map((value) => (value === 0 ? 0 : value));

/** How far two numbers lie apart, as a share of the larger. */
export const relative = (got: number, want: number): number =>
  got === want ? 0 : Math.abs(got - want) / Math.max(Math.abs(got), Math.abs(want));

export const INCH = 0.0254;
export const MM = 1e-3;
export const PSI = 6894.757293168362;
/** cc/min in m³/s */
export const CC_PER_MINUTE = 1e-6 / 60;
