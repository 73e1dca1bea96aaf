import { numberProblem, type Bounds, type FieldProblem } from './worked';

interface Count {
  atLeast?: number;
  atMost?: number;
}

/** What a list of readings is called in sentences: `{ list: 'The readings', one: 'Reading' }` → "Reading 3 must be …". */
export interface Called {
  list: string;
  one: string;
}

const asWord = (count: number, one: string) => `${count} ${one.toLowerCase()}${count === 1 ? '' : 's'}`;

/** The problem of how many entries a list has, or of something that is no list. */
export function countProblem(
  field: string,
  { list, one }: Called,
  values: unknown,
  { atLeast = 1, atMost = 100 }: Count = {},
): FieldProblem[] {
  if (!Array.isArray(values)) return [{ field, message: `${list} must be a list.` }];
  if (values.length < atLeast) return [{ field, message: `${list} must hold ${asWord(atLeast, one)} or more.` }];
  if (values.length > atMost) return [{ field, message: `${list} must hold ${asWord(atMost, one)} or fewer.` }];
  return [];
}

/** The problems of a list of numbers: its count, or each number by its place (`readings.2`, "Reading 3"). */
export function listProblems(
  field: string,
  called: Called,
  values: readonly number[],
  bounds: Bounds,
  count: Count = {},
): FieldProblem[] {
  const problem = countProblem(field, called, values, count);
  if (problem.length > 0) return problem;
  // Array.from, because a list with a hole in it would skip the hole.
  return Array.from(values).flatMap((value, place) =>
    numberProblem(`${field}.${place}`, `${called.one} ${place + 1}`, value, bounds),
  );
}

/** The smallest of some readings; the list is not empty. */
export const smallestOf = (values: readonly number[]): number => Math.min(...values);
export const largestOf = (values: readonly number[]): number => Math.max(...values);
/** Largest less smallest. */
export const rangeOf = (values: readonly number[]): number => largestOf(values) - smallestOf(values);
/** Sorted before adding, so that the same readings in another order give the same last digit. */
export const meanOf = (values: readonly number[]): number =>
  [...values].sort((a, b) => a - b).reduce((sum, value) => sum + value, 0) / values.length;
