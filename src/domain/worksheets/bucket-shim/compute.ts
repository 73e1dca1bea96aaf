import { said } from '../../measure/said';
import type { Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inShort, outcomeOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';
import { oneValve } from './valve';

/** Lash of each valve, and the shim for each that is out; see `measure/shims.ts`. */
export function compute(inputs: Values<typeof fields>): Worked<Outcome> {
  const findings: Finding[] = [];
  const results: Result[] = [];
  for (const place of inputs.valves.keys()) {
    const one = oneValve(inputs, place);
    if (!one.ok) return one;
    findings.push(...one.value.findings);
    results.push(...one.value.results);
  }
  return outcomeOf(inShort(findings, said`Every lash that has a limit is within it.`), results);
}
