import { depthAcrossJoint, type BarReading } from '../../measure/depthOverBar';
import { said } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, lookAgain, measured, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import { FINE, mistakeFinding, mm, SOURCE } from './depth';
import type { fields } from './schema';

/** The two depths added, where there is a second reading. Two readings, so two bars. */
export function acrossJoint(inputs: Values<typeof fields>): Worked<{ findings: Finding[]; results: Result[] }> {
  const { facing, reading, bar, from: readFrom, zero: zeroOffset, direction, total: band } = inputs;
  if (facing === undefined) {
    // The first reading alone may be judged, but must not pass for the whole.
    const missing = said`The reading from the face that meets it is missing, so what lies between the two is not known yet.`;
    return worked({ findings: band || inputs.facingDistance ? [lookAgain(missing)] : [], results: [] });
  }
  if (direction === 'above')
    return refused({
      field: 'direction',
      message: 'Two depths add up over a joint only where both lie below their faces.',
    });
  const gauge = (read: number): BarReading => ({ reading: read, bar, readFrom, zeroOffset });
  const found = depthAcrossJoint({ first: gauge(reading), second: gauge(facing), band });
  if (!found.ok)
    return inBoxes(found, {
      'first.reading': 'reading',
      'second.reading': 'facing',
      'first.bar': 'bar',
      'second.bar': 'bar',
      'first.readFrom': 'from',
      'second.readFrom': 'from',
      'first.zeroOffset': 'zero',
      'second.zeroOffset': 'zero',
      band: 'total',
    });
  const { depths, distance, judged, mistaken, onlyMistakePasses } = found.value;
  const passing = mistaken.find((one) => one.judged?.at === 'in')?.distance ?? 0;
  return worked({
    findings: [
      ...judgedFinding({
        subject: 'Both distances together are',
        value: distance,
        judged,
        band,
        unit: 'mm',
        fineness: FINE,
      }),
      ...mistakeFinding(inputs, 'both together', { onlyMistakePasses, distance: passing }),
    ],
    results: [
      measured('total', 'Both distances together', distance, 'mm', FINE, {
        verdict: verdictOf(judged),
        formula: said`first + second = ${mm(depths[0])} + ${mm(depths[1])} = ${mm(distance)}`,
        source: SOURCE,
        main: true,
      }),
    ],
  });
}
