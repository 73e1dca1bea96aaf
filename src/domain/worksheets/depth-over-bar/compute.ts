import { optionalBandProblems, placeInIfAny } from '../../measure/band';
import { said } from '../../measure/said';
import { refused, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { judgedFinding, noted, outcomeOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import { FINE, mm, oneDepth } from './depth';
import { acrossJoint } from './joint';
import type { fields } from './schema';

/** True distances over a bar; see `measure/depthOverBar.ts`. What the forgotten bar would answer always stands beside. */
export function compute(inputs: Values<typeof fields>): Worked<Outcome> {
  const { reading, facing, bar, thickness } = inputs;
  const findings: Finding[] = [];
  const results: Result[] = [];
  const first = { box: 'reading', band: 'distance', key: 'distance', called: 'The distance' } as const;
  const second = {
    box: 'facing',
    band: 'facingDistance',
    key: 'facing',
    called: 'The distance from the other face',
  } as const;
  const depths = [
    oneDepth(inputs, first, reading),
    ...(facing === undefined ? [] : [oneDepth(inputs, second, facing)]),
  ];
  for (const depth of depths) {
    if (!depth.ok) return depth;
    findings.push(...depth.value.findings);
    results.push(...depth.value.results);
  }
  const joint = acrossJoint(inputs);
  if (!joint.ok) return joint;
  const problems = optionalBandProblems('thickness', 'The thickness allowed', thickness, { above: 0, most: 10 });
  if (problems.length > 0) return refused(...problems);
  findings.push(
    ...joint.value.findings,
    ...judgedFinding({
      subject: 'The bar is',
      value: bar,
      judged: placeInIfAny(bar, thickness),
      band: thickness,
      unit: 'mm',
      fineness: FINE,
    }),
  );
  if (findings.length === 0)
    findings.push(
      noted(
        inputs.from === 'bar-top'
          ? said`The bar of ${mm(bar)} is taken off.`
          : said`The gauge was set to zero over the bar, so nothing is taken off.`,
      ),
    );
  return outcomeOf(findings, [...results, ...joint.value.results]);
}
