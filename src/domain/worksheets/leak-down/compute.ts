import { optionalBandProblems, placeIn, placeInIfAny } from '../../measure/band';
import type { BothUnits } from '../../measure/format';
import { judgeLeakDown, testerOrifice, type LeakDownFound } from '../../measure/leakDown';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import {
  allowed,
  inBoxes,
  inShort,
  judgedFinding,
  lookAgain,
  measured,
  noted,
  outcomeOf,
  verdictOf,
  type Finding,
} from '../findings';
import type { Outcome, Result } from '../outcome';
import { leakReadings } from './readings';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

const percent = (share: number) => show(share, '%', 1);
const kPa = (pascals: number) => show(pascals, 'kPa', 5);
const LOSS = 'Loss = (supply − cylinder) / supply: AC 43.13-1B ¶ 8-14 (80 over 60 psi is 25 %).';

/** Loss of each cylinder; see `measure/leakDown.ts`. What is heard is looked at, whatever the loss. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const readings = leakReadings(inputs);
  if (!readings.ok) return readings;
  const { loss: band, supply, supplied } = inputs;
  const found = judgeLeakDown(readings.value, band);
  if (!found.ok) return inBoxes(found, { band: 'loss', ...cylinderBoxes(readings.value) });
  const problems = optionalBandProblems('supplied', 'The supply pressure allowed', supplied, { least: 0, most: 1e9 });
  if (problems.length > 0) return refused(...problems);
  const orifice = orificeResults(inputs);
  if (!orifice.ok) return orifice;

  const { cylinders, worst } = found.value;
  const findings = [
    ...lossFindings(inputs, cylinders, percent(worst)),
    ...readings.value.flatMap((one, place) => (one?.heard ?? []).map((at) => heardFinding(at, place + 1))),
    ...(supply === undefined
      ? []
      : judgedFinding({
          subject: 'The supply pressure is',
          value: supply,
          judged: placeInIfAny(supply, supplied),
          band: supplied,
          unit: 'kPa',
          fineness: 5,
        })),
  ];
  const results = cylinders.flatMap((one, place): Result[] => {
    if (one === null) return [];
    const { lossPercent, judged } = one;
    return [
      measured(`loss-${place + 1}`, `Loss, cylinder ${place + 1}`, lossPercent, '%', 1, {
        verdict: verdictOf(judged) ?? (!band && isSuspect(inputs, lossPercent) ? 'look' : undefined),
        ...formulaOf(inputs, place, lossPercent),
        source: LOSS,
        // The one that decides, alone: a screen that shows a single number shows this one.
        main: place === cylinders.findIndex((other) => other?.lossPercent === worst),
      }),
    ];
  });
  return outcomeOf(
    findings,
    [...results, ...orifice.value],
    [
      {
        kind: 'bars',
        title: 'Loss by cylinder',
        unit: '%',
        fineness: 1,
        items: cylinders.map((_, place) => String(place + 1)),
        series: [{ label: 'Loss', values: cylinders.map((one) => one?.lossPercent ?? null) }],
        ...(band && { band }),
      },
    ],
  );
}

/** 80 over 60 psi is 25 % and not a hair more, whatever the conversion of the pressures leaves behind. */
const isSuspect = ({ suspect }: Inputs, loss: number) => placeIn(loss, { max: suspect }, 100).at === 'over';

function lossFindings(inputs: Inputs, cylinders: LeakDownFound['cylinders'], worst: BothUnits): Finding[] {
  const { loss: band, suspect } = inputs;
  const each = cylinders.flatMap((one, place): Finding[] => {
    if (one === null) return [];
    const subject = `Cylinder ${place + 1} loses`;
    const { lossPercent, judged } = one;
    if (band) return judgedFinding({ subject, value: lossPercent, judged, band, unit: '%', fineness: 1 });
    if (!isSuspect(inputs, lossPercent)) return [];
    const from = percent(suspect);
    return [lookAgain(said`${subject} ${percent(lossPercent)}, more than the ${from} from which it is suspect.`)];
  });
  if (band) return inShort(each, said`The largest loss is ${worst}; ${allowed(band, '%', 1)}.`);
  return each.length > 0 ? each : [noted(said`The largest loss is ${worst}; no limit was given.`)];
}

const cylinderBoxes = (readings: readonly unknown[]) =>
  Object.fromEntries(
    readings.flatMap((_, place) => [
      [`readings.${place}.supply`, 'supply'],
      [`readings.${place}.cylinder`, `cylinders.${place}.pressure`],
    ]),
  );

function formulaOf({ supply, cylinders }: Inputs, place: number, loss: number): Pick<Result, 'formula'> {
  const pressure = cylinders[place]?.pressure;
  if (supply === undefined || pressure === undefined) return {};
  return {
    formula: said`(supply − cylinder) / supply = (${kPa(supply)} − ${kPa(pressure)}) / ${kPa(supply)} = ${percent(loss)}`,
  };
}

const HEARD = {
  intake: 'air at the intake points at the intake valve. That is never right, at any loss.',
  exhaust: 'air at the exhaust points at the exhaust valve. That is never right, at any loss.',
  crankcase: 'air at the oil filler points at rings, piston or bore. Every engine sighs a little there.',
  coolant: 'bubbles in the coolant point at head gasket, head or liner. Do not run the engine before it is found.',
  neighbour: 'air at the next plug hole points at the gasket between the two cylinders.',
} as const;

const heardFinding = (at: keyof typeof HEARD, cylinder: number): Finding =>
  (at === 'crankcase' ? noted : lookAgain)(said`Cylinder ${cylinder}: ${HEARD[at]}`);

function orificeResults({ bore }: Inputs): Worked<Result[]> {
  if (bore === undefined) return worked([]);
  const found = testerOrifice(bore);
  if (!found.ok) return found;
  const source = 'Orifice of the tester: FAA safety tip, November 2011, quoting AC 43.13-1B Change 1.';
  return worked([
    measured('orifice', 'Orifice of an aircraft tester for this bore', found.value.diameter, 'mm', 0.01, { source }),
    measured('orifice-length', 'Length of that orifice, with a 60° approach', found.value.length, 'mm', 0.01, {
      source,
    }),
  ]);
}
