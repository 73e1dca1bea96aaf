import { said } from '../../measure/said';
import { refused, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { noted, outcomeOf } from '../findings';
import type { Outcome } from '../outcome';
import { plate } from './plate';
import type { fields } from './schema';
import { straightedge } from './straightedge';

/** Gaps under a straightedge, heights on a plate, or both. */
export function compute(inputs: Values<typeof fields>): Worked<Outcome> {
  if (inputs.gaps.length === 0 && inputs.points.length === 0)
    return refused({ field: 'gaps.0.gap', message: 'Fill in a gap under the straightedge, or heights on a plate.' });
  const edge = straightedge(inputs);
  if (!edge.ok) return edge;
  const heights = plate(inputs);
  if (!heights.ok) return heights;
  const findings = [...edge.value.findings, ...heights.value.findings];
  if (findings.length === 0) findings.push(noted(said`Worked out; no limit was given.`));
  return outcomeOf(findings, [...edge.value.results, ...heights.value.results]);
}
