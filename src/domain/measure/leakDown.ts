import { nothingFails, optionalBandProblems, placeInIfAny, sameWithin, type Band, type Judged } from './band';
import { PRESSURE, SIZE, SOME_PRESSURE, TOLERANCE_PERCENT } from './reach';
import { countProblem } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** Where the air is heard or seen, and what it points at. Common practice, no source. */
export const HEARD = {
  intake: 'intake valve',
  exhaust: 'exhaust valve',
  crankcase: 'rings, piston or bore',
  coolant: 'head gasket, head or liner',
  neighbour: 'gasket between the two cylinders',
} as const;
export type Heard = keyof typeof HEARD;

export interface LeakReading {
  /** Pressure the tester is fed with, Pa gauge. */
  supply: number;
  /** Pressure in the cylinder, Pa gauge. */
  cylinder: number;
  heard?: readonly Heard[];
}

function readingProblems({ supply, cylinder, heard }: LeakReading, at = '', whose = ''): FieldProblem[] {
  const problems = [
    ...numberProblem(`${at}supply`, `The supply pressure${whose}`, supply, SOME_PRESSURE),
    ...numberProblem(`${at}cylinder`, `The cylinder pressure${whose}`, cylinder, PRESSURE),
  ];
  if (problems.length === 0 && cylinder > supply && !sameWithin(cylinder, supply))
    problems.push({
      field: `${at}cylinder`,
      message: `The cylinder pressure${whose} cannot be more than the supply; the tester needs its zero set.`,
    });
  if (
    heard !== undefined &&
    !(Array.isArray(heard) && heard.length <= 5 && heard.every((place: Heard) => Object.hasOwn(HEARD, place)))
  )
    problems.push({ field: `${at}heard`, message: `Where air is heard${whose} must be chosen from the list.` });
  return problems;
}

/** A hair above the supply is none, so that no loss is 0 and never less. */
const lossOf = ({ supply, cylinder }: LeakReading) => Math.max(0, (100 * (supply - cylinder)) / supply);

/**
 * Loss of a differential pressure test, per cent of the supply: (supply − cylinder) / supply; 80 over 60 psi is 25 %.
 * Both are gauge pressures. Source: AC 43.13-1B ¶ 8-14. The number belongs to the tester's orifice (`testerOrifice`):
 * two testers do not give the same per cent.
 *
 * Errors name `supply` or `cylinder`.
 */
export const lossPercent = (supply: number, cylinder: number): Worked<number> =>
  work(readingProblems({ supply, cylinder }), 'cylinder', () => lossOf({ supply, cylinder }));

/** The cylinder pressure in Pa that a loss in per cent leaves; `lossPercent` the other way round. */
export const pressureAtLoss = (supply: number, loss: number): Worked<number> =>
  work(
    [
      ...numberProblem('supply', 'The supply pressure', supply, SOME_PRESSURE),
      ...numberProblem('loss', 'The loss', loss, { least: 0, most: 100, say: (bound) => `${bound} %` }),
    ],
    'supply',
    () => supply * (1 - loss / 100),
  );

export interface CylinderLeak {
  lossPercent: number;
  judged: Judged | null;
  /** What each place points at, in the order given. */
  pointsAt: (typeof HEARD)[Heard][];
}

export interface LeakDownFound {
  /** By the places of the readings; null where a cylinder was not tested. */
  cylinders: (CylinderLeak | null)[];
  /** Largest loss, per cent. */
  worst: number;
  passes: boolean;
}

/**
 * A leak-down test of one cylinder or more; null stands for one that was not tested. Of the loss, `{ max: 25 }` is the published suspicion for aircraft (AC 43.13-1B
 * ¶ 8-14, with its own orifice); a shop's limit is its own. A sound at intake, exhaust, coolant or neighbour is a finding
 * at any per cent, but the verdict is on the number alone: every engine sighs a little into its crankcase.
 *
 * Errors name `readings`, `readings.<place>.<supply|cylinder|heard>` or `band`.
 */
export function judgeLeakDown(readings: readonly (LeakReading | null)[], band?: Band): Worked<LeakDownFound> {
  const count = countProblem('readings', { list: 'The leak-down test', one: 'Cylinder' }, readings, { atMost: 64 });
  if (count.length === 0 && readings.every((reading) => reading === null))
    count.push({ field: 'readings', message: 'The leak-down test must hold one cylinder that was tested.' });
  const problems = [
    ...count,
    ...(count.length > 0
      ? []
      : Array.from(readings).flatMap((reading, place) =>
          reading === null ? [] : readingProblems(reading ?? {}, `readings.${place}.`, ` of cylinder ${place + 1}`),
        )),
    ...optionalBandProblems('band', 'The loss allowed', band, TOLERANCE_PERCENT),
  ];
  return work(problems, 'readings', () => {
    const cylinders = readings.map((reading) => {
      if (reading === null) return null;
      const loss = lossOf(reading);
      const pointsAt = (reading.heard ?? []).map((place) => HEARD[place]);
      return { lossPercent: loss, judged: placeInIfAny(loss, band, 100), pointsAt };
    });
    const tested = cylinders.filter((one) => one !== null);
    return {
      cylinders,
      worst: Math.max(...tested.map((one) => one.lossPercent)),
      passes: nothingFails(tested.map(({ judged }) => judged)),
    };
  });
}

const INCH = 0.0254;

export interface Orifice {
  /** m */
  diameter: number;
  /** m */
  length: number;
  /** Degrees. */
  approach: number;
}

/**
 * The restrictor of a differential tester by the bore it is used on: 0.040 in below 5.00 in, else 0.060 in; 0.250 in
 * long with a 60° approach. For information. Source: FAA safety tip of November 2011 quoting AC 43.13-1B Change 1.
 *
 * @param bore m
 */
export const testerOrifice = (bore: number): Worked<Orifice> =>
  work(numberProblem('bore', 'The bore', bore, SIZE), 'bore', () => {
    const small = bore < 5 * INCH && !sameWithin(bore, 5 * INCH);
    return { diameter: (small ? 0.04 : 0.06) * INCH, length: 0.25 * INCH, approach: 60 };
  });
