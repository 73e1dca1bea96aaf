import { clampCheck, type ClampCheck, type ClampInput } from '../../measure/clampLoad';
import { said } from '../../measure/said';
import { mixUpOfSize, mixUpsOfChange } from '../../measure/unitMixUp';
import { type FieldProblem, type Worked, refused, worked } from '../../measure/worked';
import type { Values } from '../fields';
import { worst, type Outcome, type Verdict } from '../outcome';
import { resultsOf } from './results';
import type { fields } from './schema';

const VERDICTS: Readonly<Record<ClampCheck['verdict'], Verdict>> = {
  over: 'fail',
  low: 'look',
  ok: 'pass',
  unknown: 'none',
};

/** Box of each input of the check. */
const BOXES: Readonly<Record<string, string>> = {
  nm: 'torque',
  class: 'propertyClass',
  'angles.0': 'angle',
  after: 'torque',
};
const inBoxes = (problems: readonly FieldProblem[]): FieldProblem[] =>
  problems.map(({ field, message }) => ({ field: BOXES[field] ?? field, message }));

/** Whether a torque is plausible for its fastener, and whether its figure looks like one in another unit. */
export function compute(values: Values<typeof fields>): Worked<Outcome> {
  const { thread, pitch, propertyClass, torque, condition, angle, before, low } = values;
  const input: ClampInput = {
    nm: torque,
    thread,
    condition,
    ...(pitch !== undefined && { pitch: Number((pitch * 1000).toPrecision(12)) }),
    ...(propertyClass !== undefined && { class: propertyClass }),
    ...(angle !== undefined && { angles: [angle] }),
  };
  const check = clampCheck(input, low / 100);
  if (!check.ok) return refused(...inBoxes(check.problems));
  const bySize = mixUpOfSize(input);
  if (!bySize.ok) return refused(...inBoxes(bySize.problems));
  const byChange = before === undefined ? undefined : mixUpsOfChange(before, torque);
  if (byChange && !byChange.ok) return refused(...inBoxes(byChange.problems));

  const mixUps = [bySize.value, ...(byChange?.value ?? [])].flatMap((found) => (found ? [found.says] : []));
  const [first, ...others] = [check.value.why, ...mixUps];
  return worked({
    verdict: worst([VERDICTS[check.value.verdict], mixUps.length > 0 ? 'look' : undefined]),
    reasons: [first ?? '', ...others].map((reason) => said`${reason}`),
    results: resultsOf(torque, check.value, VERDICTS[check.value.verdict]),
    charts: [],
  });
}
