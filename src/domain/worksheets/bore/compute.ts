import { judgeBore, type BoreFound } from '../../measure/bore';
import { said, show } from '../../measure/said';
import type { Worked } from '../../measure/worked';
import type { Chart } from '../charts';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, lookAgain, measured, noted, outcomeOf, verdictOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Bore gauges read to a thousandth. */
const FINE = 0.001;
const mm = (metres: number) => show(metres, 'mm', FINE);

const BOXES = {
  readings: 'heights',
  'limits.diameter': 'diameter',
  'limits.taper': 'taper',
  'limits.cylindricity': 'taper',
  'limits.outOfRound': 'roundness',
  'limits.clearance': 'clearance',
};

/** Judges one bore; see `measure/bore.ts`. Of the two ways to take taper, the one that was chosen is judged. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const { heights, nominal, piston, taperRule, diameter, taper, roundness, clearance } = inputs;
  const found = judgeBore({
    readings: heights.map(({ thrust, along }) => [thrust, along]),
    nominal,
    piston,
    limits: {
      diameter,
      outOfRound: roundness,
      clearance,
      ...(taperRule === 'ends' ? { taper } : { cylindricity: taper }),
    },
  });
  if (!found.ok) return inBoxes(found, BOXES);
  return outcomeOf(findingsOf(inputs, found.value), resultsOf(inputs, found.value), [shapeOf(inputs)]);
}

const taperOf = ({ taperRule }: Inputs, { worstTaper, cylindricity, judged }: BoreFound) =>
  taperRule === 'ends'
    ? { value: worstTaper, judged: judged.taper, words: 'top less bottom' }
    : { value: cylindricity, judged: judged.cylindricity, words: 'largest less smallest' };

function findingsOf(inputs: Inputs, found: BoreFound): Finding[] {
  const { judged } = found;
  const taper = taperOf(inputs, found);
  const under = judged.diameter?.at === 'under';
  const inMm = { unit: 'mm', fineness: FINE } as const;
  const findings = [
    ...judgedFinding({
      subject: under ? 'The smallest diameter is' : 'The largest diameter is',
      value: under ? found.smallest : found.largest,
      judged: judged.diameter,
      band: inputs.diameter,
      ...inMm,
    }),
    ...judgedFinding({
      subject: 'Taper is',
      value: taper.value,
      judged: taper.judged,
      band: inputs.taper,
      ...inMm,
    }),
    ...judgedFinding({
      subject: 'Out-of-round is',
      value: found.worstOutOfRound,
      judged: judged.outOfRound,
      band: inputs.roundness,
      ...inMm,
    }),
    ...judgedFinding({
      subject: 'Piston clearance is',
      value: found.clearance?.least ?? 0,
      judged: judged.clearance,
      band: inputs.clearance,
      ...inMm,
    }),
  ];
  if (found.clearance && found.clearance.least < 0)
    findings.push(lookAgain(said`The piston is larger than the smallest reading by ${mm(-found.clearance.least)}.`));
  return findings.length > 0
    ? findings
    : [noted(said`Taper is ${mm(taper.value)}, out-of-round ${mm(found.worstOutOfRound)}; no limit was given.`)];
}

function resultsOf(inputs: Inputs, found: BoreFound): Result[] {
  const taper = taperOf(inputs, found);
  const { clearance, wear, judged } = found;
  const least = found.smallest;
  const source = 'Taper on one axis, out-of-round at one height: TM 9-2815-202-34, p. 4-147.';
  return [
    measured('taper', `Taper, ${taper.words} on one axis`, taper.value, 'mm', FINE, {
      verdict: verdictOf(taper.judged),
      source,
      main: true,
    }),
    measured('out-of-round', 'Out-of-round, the worst height', found.worstOutOfRound, 'mm', FINE, {
      verdict: verdictOf(judged.outOfRound),
      source,
      main: true,
    }),
    ...(clearance
      ? [
          measured('clearance', 'Piston clearance', clearance.least, 'mm', FINE, {
            verdict: verdictOf(judged.clearance),
            formula: said`smallest reading − piston = ${mm(least)} − ${mm(least - clearance.least)} = ${mm(clearance.least)}`,
            main: true,
          }),
          measured('clearance-greatest', 'Piston clearance at the largest reading', clearance.greatest, 'mm', FINE),
        ]
      : []),
    measured('smallest', 'Smallest diameter', found.smallest, 'mm', FINE, {
      verdict: judged.diameter?.at === 'under' ? 'fail' : undefined,
    }),
    measured('largest', 'Largest diameter', found.largest, 'mm', FINE, {
      verdict: judged.diameter?.at === 'under' ? undefined : verdictOf(judged.diameter),
    }),
    ...(wear === null ? [] : [measured('wear', 'Wear, the largest reading less the new bore', wear, 'mm', FINE)]),
    ...found.outOfRound.map((value, place) =>
      measured(`out-of-round-${place + 1}`, `Out-of-round, height ${place + 1}`, value, 'mm', FINE),
    ),
  ];
}

const HEIGHTS: Readonly<Record<number, string[]>> = { 2: ['Top', 'Bottom'], 3: ['Top', 'Middle', 'Bottom'] };

const shapeOf = ({ heights, nominal, diameter }: Inputs): Chart => ({
  kind: 'shape',
  title: 'The bore as it stands, differences drawn many times too large',
  unit: 'mm',
  fineness: FINE,
  heights: HEIGHTS[heights.length] ?? [],
  axes: [
    { label: 'Across the thrust faces', diameters: heights.map(({ thrust }) => thrust) },
    { label: 'Along the crankshaft', diameters: heights.map(({ along }) => along) },
  ],
  ...(nominal !== undefined && { nominal }),
  ...(diameter && { band: diameter }),
});
