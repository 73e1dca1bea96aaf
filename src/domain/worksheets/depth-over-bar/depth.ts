import { lowered } from '../../wording';
import type { Judged } from '../../measure/band';
import { depthOverBar } from '../../measure/depthOverBar';
import { said, show } from '../../measure/said';
import { worked, type Worked } from '../../measure/worked';
import type { Band, Values } from '../fields';
import { inBoxes, judgedFinding, measured, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Depth gauges read to a hundredth of a mm. */
export const FINE = 0.01;
export const mm = (metres: number) => show(metres, 'mm', FINE);
export const SOURCE = 'Depth = reading − zero − bar: geometry, no published source.';

/** Says when only the mistake would pass, so that nobody signs it. */
export function mistakeFinding(
  inputs: Inputs,
  subject: string,
  { onlyMistakePasses, distance }: { onlyMistakePasses: boolean; distance: number },
): Finding[] {
  if (!onlyMistakePasses) return [];
  const slip = inputs.from === 'bar-top' ? 'the bar left in' : 'the bar taken off a second time';
  return [{ verdict: 'fail', text: said`With ${slip}, ${subject} would come to ${mm(distance)} and seem to pass.` }];
}

interface Asked {
  box: 'reading' | 'facing';
  band: 'distance' | 'facingDistance';
  key: string;
  /** "The distance", as a sentence begins. */
  called: string;
}

/** One reading: its true distance, judged. */
export function oneDepth(
  inputs: Inputs,
  { box, band: name, key, called }: Asked,
  read: number,
): Worked<{ findings: Finding[]; results: Result[]; judged: Judged | null }> {
  const band: Band | undefined = inputs[name];
  const { bar, from, direction, zero } = inputs;
  const found = depthOverBar({ reading: read, bar, readFrom: from, zeroOffset: zero, direction, band });
  if (!found.ok) return inBoxes(found, { reading: box, readFrom: 'from', zeroOffset: 'zero', band: name });
  const { distance, judged, mistaken, onlyMistakePasses } = found.value;
  const side = direction === 'below' ? 'below' : 'above';
  return worked({
    judged,
    findings: [
      ...judgedFinding({ subject: `${called} is`, value: distance, judged, band, unit: 'mm', fineness: FINE }),
      ...mistakeFinding(inputs, lowered(called), { onlyMistakePasses, distance: mistaken.distance }),
    ],
    results: [
      measured(key, `${called}, ${side} its face`, distance, 'mm', FINE, {
        verdict: verdictOf(judged),
        formula: formulaOf(inputs, read, distance),
        source: SOURCE,
        main: true,
      }),
      measured(
        `${key}-mistaken`,
        `What it would seem with ${from === 'bar-top' ? 'the bar forgotten' : 'the bar taken off once more'}`,
        mistaken.distance,
        'mm',
        FINE,
      ),
    ],
  });
}

function formulaOf({ bar, from, direction, zero }: Inputs, read: number, distance: number) {
  const off = zero === undefined ? said`` : said` − (${mm(zero)})`;
  const zeroWord = zero === undefined ? '' : ' − zero';
  const above = direction === 'above';
  if (from === 'face')
    return above
      ? said`−(reading${zeroWord}) = −(${mm(read)}${off}) = ${mm(distance)}`
      : said`reading${zeroWord} = ${mm(read)}${off} = ${mm(distance)}`;
  return above
    ? said`bar − (reading${zeroWord}) = ${mm(bar)} − (${mm(read)}${off}) = ${mm(distance)}`
    : said`reading${zeroWord} − bar = ${mm(read)}${off} − ${mm(bar)} = ${mm(distance)}`;
}
