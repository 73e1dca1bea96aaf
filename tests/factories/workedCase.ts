import type { FieldProblem } from '@/domain/measure/worked';
import type { Outcome } from '@/domain/worksheets/outcome';
import { worksheetNamed } from '@/domain/worksheets/registry';
import { nest } from '@/domain/worksheets/typedIn';
import { workOut } from '@/domain/worksheets/work';
import type { TypedIn } from '@/domain/worksheets/worksheet';

function result(name: string, typed: TypedIn) {
  const worksheet = worksheetNamed(name);
  if (!worksheet) throw new Error(`There is no worksheet ${name}.`);
  return workOut(worksheet, nest(worksheet.fields, typed)).outcome;
}

/** What a worksheet says to texts typed into its boxes, in metric units. */
export function answerOf(name: string, typed: TypedIn): Outcome {
  const outcome = result(name, typed);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ field, message }) => `${field}: ${message}`).join(' '));
  return outcome.value;
}

/** What it refuses, box by box. */
export function problemsOf(name: string, typed: TypedIn): FieldProblem[] {
  const outcome = result(name, typed);
  return outcome.ok ? [] : outcome.problems;
}

/** Text of one result in metric and in inch units; undefined where there is none of that key. */
export const textOf = ({ results }: Outcome, key: string) => results.find((one) => one.key === key)?.text;
/** The sentences as a metric reader sees them. */
export const reasonsOf = ({ reasons }: Outcome): string[] => reasons.map(({ metric }) => metric);
