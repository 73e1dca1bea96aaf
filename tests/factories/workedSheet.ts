import type { Fields } from '@/domain/worksheets/fields';
import type { Outcome } from '@/domain/worksheets/outcome';
import type { TypedIn, Worksheet } from '@/domain/worksheets/worksheet';
import { answerOf, problemsOf, reasonsOf } from './workedCase';

/** Boxes by their paths; `undefined` for one of the example that is left empty. */
export type Filled = Readonly<Record<string, string | undefined>>;

const texts = (filled: Filled): TypedIn =>
  Object.fromEntries(Object.entries(filled).filter((entry): entry is [string, string] => entry[1] !== undefined));

/** What a worksheet answers, as a reader in metric units sees it: sentences, and texts and verdicts of results by their keys. */
export function seen<F extends Fields>({ name }: Worksheet<F>, filled: Filled) {
  const outcome: Outcome = answerOf(name, texts(filled));
  return {
    verdict: outcome.verdict,
    reasons: reasonsOf(outcome),
    results: Object.fromEntries(outcome.results.map(({ key, text }) => [key, text.metric])),
    verdicts: Object.fromEntries(outcome.results.map(({ key, verdict }) => [key, verdict])),
    outcome,
  };
}

/** What it refuses, by the box. */
export function refusedBoxes<F extends Fields>({ name }: Worksheet<F>, filled: Filled): Record<string, string> {
  const problems = problemsOf(name, texts(filled));
  if (problems.length === 0) throw new Error('It was not refused.');
  return Object.fromEntries(problems.map(({ field, message }) => [field, message]));
}
