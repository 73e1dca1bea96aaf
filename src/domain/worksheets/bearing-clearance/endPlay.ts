import { crankEndPlay } from '../../measure/endPlay';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, measured, noted, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

/** Dials for end play read to a hundredth, in mm. */
const FINE = 0.01;
const mm = (metres: number) => show(metres, 'mm', FINE);

type Asked = Pick<Values<typeof fields>, 'forward' | 'back' | 'play'>;

/** End play, where both positions of the dial are known. */
export function endPlay({ forward, back, play: band }: Asked): Worked<{ findings: Finding[]; results: Result[] }> {
  if (forward === undefined && back === undefined) return worked({ findings: [], results: [] });
  if (forward === undefined || back === undefined)
    return refused({
      field: forward === undefined ? 'forward' : 'back',
      message: 'End play needs the dial with the crankshaft pushed both ways.',
    });
  const found = crankEndPlay({ forward: [forward], back: [back], band });
  if (!found.ok) return inBoxes(found, { 'forward.0': 'forward', 'back.0': 'back', band: 'play' });
  const { play, judged } = found.value;
  const judgement = judgedFinding({ subject: 'End play is', value: play, judged, band, unit: 'mm', fineness: FINE });
  return worked({
    findings: judgement.length > 0 ? judgement : [noted(said`End play is ${mm(play)}.`)],
    results: [
      measured('end-play', 'End play', play, 'mm', FINE, {
        verdict: verdictOf(judged),
        formula: said`between ${mm(back)} and ${mm(forward)} on the dial: ${mm(play)}`,
        source: 'End play by a dial, pushed both ways: common practice, no published source.',
      }),
    ],
  });
}
