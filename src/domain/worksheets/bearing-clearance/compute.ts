import { said } from '../../measure/said';
import type { Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inShort, noted, outcomeOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import { FINE, oneBearing } from './bearing';
import { endPlay } from './endPlay';
import type { fields } from './schema';
import { sizesAllow } from './sizesAllow';

/** Oil clearance of each bearing, what the allowed sizes can meet in, and end play; see `measure/bearings.ts`. */
export function compute(inputs: Values<typeof fields>): Worked<Outcome> {
  const findings: Finding[] = [];
  const results: Result[] = [];
  const clearances: number[] = [];
  for (const place of inputs.bearings.keys()) {
    const one = oneBearing(inputs, place);
    if (!one.ok) return one;
    findings.push(...one.value.findings);
    results.push(...one.value.results);
    clearances.push(one.value.clearance);
  }
  const stack = sizesAllow(inputs);
  if (!stack.ok) return stack;
  const play = endPlay(inputs);
  if (!play.ok) return play;

  const all = [...inShort(findings, said`Every bearing is within its limits.`), ...play.value.findings];
  if (all.length === 0) all.push(noted(said`Worked out; no limit was given.`));
  return outcomeOf(
    all,
    [...results, ...stack.value, ...play.value.results],
    [
      {
        kind: 'bars',
        title: 'Oil clearance by bearing',
        unit: 'mm',
        fineness: FINE,
        items: inputs.bearings.map((_, place) => String(place + 1)),
        series: [{ label: 'Oil clearance', values: clearances }],
        ...(inputs.clearance && { band: inputs.clearance }),
      },
    ],
  );
}
