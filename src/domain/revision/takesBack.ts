import type { Procedure, Step } from '../procedure/types';
import { compareValues } from './compareValues';
import type { ValueChange } from './types';
import { valueWords } from './valueWords';

/** Something that an earlier revision changed and a proposal sets back to what it was before. */
export interface TakenBack {
  /** The path of a value, `step:<id>`, `intro`, or `order` for the order of the steps. */
  place: string;
  /** What the revision did: "Cover bolt torque, 10 to 12 N·m". */
  words: string;
}

const changes = (from: Procedure, to: Procedure) =>
  compareValues(from.frontmatter, to.frontmatter).map(({ change }) => change);

/** Whether a value, or any field of an entry, is among those that differ. */
const touched = (differing: readonly ValueChange[], { path, list, key }: ValueChange) =>
  differing.some(
    (other) => other.path === path || (list !== 'head' && key !== null && other.path.startsWith(`${path}.`)),
  );

/** A step as it is stored: values that it only points at are told by themselves. */
const rawStep = (step: Step | undefined) => step && JSON.stringify([step.title, step.cautions, step.body]);

/** What became of a step; undefined where it was not there before, or is no longer. */
function stepWords(before: Step | undefined, revised: Step | undefined): string {
  const step = `step “${(revised ?? before)?.title ?? ''}”`;
  return before && revised ? `the words of ${step}` : `${step}, ${revised ? 'added' : 'removed'}`;
}

/**
 * What one earlier revision changed, the base still has, and a proposal sets back to what it was before that revision:
 * each value, step, the introduction and the order of the steps. A text that was written on an older revision and then
 * brought up to the current one undoes the newer one in just this way, without anybody meaning it to.
 *
 * @param before the revision that `revised` was made from
 * @param revised the earlier revision; the base itself for the last one
 */
export function takesBack(
  { before, revised }: { before: Procedure; revised: Procedure },
  base: Procedure,
  proposed: Procedure,
): TakenBack[] {
  const since = changes(revised, base);
  const now = changes(base, proposed);
  const apart = changes(before, proposed);
  const values = changes(before, revised)
    .filter((change) => touched(now, change) && !touched(since, change) && !touched(apart, change))
    .map((change) => ({ place: change.path, words: valueWords(change) }));

  /** Whether something was changed by the revision, stayed since, and is set back. */
  const back = <T>(of: (procedure: Procedure) => T) =>
    of(before) !== of(revised) && of(revised) === of(base) && of(base) !== of(proposed) && of(before) === of(proposed);
  const stepOf = (procedure: Procedure, id: string) => procedure.steps.find((step) => step.id === id);
  const steps = [...new Set([...revised.steps, ...before.steps].map(({ id }) => id))]
    .filter((id) => back((procedure) => rawStep(stepOf(procedure, id))))
    .map((id) => ({ place: `step:${id}`, words: stepWords(stepOf(before, id), stepOf(revised, id)) }));

  const all = [before, revised, base, proposed];
  const order = (procedure: Procedure) =>
    procedure.steps
      .map(({ id }) => id)
      .filter((id) => all.every((other) => stepOf(other, id)))
      .join(' ');
  return [
    ...values,
    ...steps,
    ...(back(({ intro }) => intro) ? [{ place: 'intro', words: 'the words of the introduction' }] : []),
    ...(back(order) ? [{ place: 'order', words: 'the order of the steps' }] : []),
  ];
}
