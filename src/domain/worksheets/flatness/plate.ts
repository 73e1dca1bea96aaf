import { bestFitPlane } from '../../measure/bestFitPlane';
import { said, show } from '../../measure/said';
import { worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, measured, noted, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

/** Lever dials read to a thousandth of a mm or two. */
const FINE = 0.001;

/** Flatness by heights, the best plane taken off; see `measure/bestFitPlane.ts`. */
export function plate({
  points,
  whole,
}: Pick<Values<typeof fields>, 'points' | 'whole'>): Worked<{ findings: Finding[]; results: Result[] }> {
  if (points.length === 0) return worked({ findings: [], results: [] });
  const found = bestFitPlane(points, whole);
  if (!found.ok) return inBoxes(found, { band: 'whole' });
  const { flatness, judged, deviations } = found.value;
  const findings = judgedFinding({
    subject: 'By the heights, the face is out of flat by',
    value: flatness,
    judged,
    band: whole,
    unit: 'mm',
    fineness: FINE,
  });
  const shown = show(flatness, 'mm', FINE);
  return worked({
    findings: findings.length > 0 ? findings : [noted(said`By the heights, the face is out of flat by ${shown}.`)],
    results: [
      measured('plane', 'Out of flat, best plane taken off', flatness, 'mm', FINE, {
        verdict: verdictOf(judged),
        main: true,
        formula: said`highest less lowest of ${points.length} points, square to the plane that fits best = ${shown}`,
        source: 'Plane by least squares: computed; the zone of ISO 1101 is never wider.',
      }),
      ...deviations.map((value, place) =>
        measured(`point-${place + 1}`, `Point ${place + 1} above the plane`, value, 'mm', FINE),
      ),
    ],
  });
}
