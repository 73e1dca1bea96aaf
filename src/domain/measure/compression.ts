import { nothingFails, optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { PRESSURE, TOLERANCE_PERCENT } from './reach';
import { largestOf, listProblems, meanOf, rangeOf, smallestOf } from './readings';
import { work, type FieldProblem, type Worked } from './worked';

/** Each rule is used where it is given. They come from different books and do not agree; the sheet says which holds. */
export interface CompressionRules {
  /** Every cylinder, Pa. */
  band?: Band;
  /** Lowest as a share of the highest, per cent. `{ min: 75 }`: TM 5-4210-230-14&P-1 Add. 2. */
  lowestOfHighest?: Band;
  /** How far a cylinder lies below the average of all, per cent. `{ max: 20 }`: TM 1-1500-204-23-1 (aircraft). */
  belowAverage?: Band;
  /** Difference between the highest and the lowest, Pa. 10 psi at most: TM 10-3930-618-20. */
  difference?: Band;
}

export interface CompressionFound {
  lowest: number;
  highest: number;
  mean: number;
  /** Highest less lowest, Pa. */
  difference: number;
  /** Lowest as a share of the highest, per cent. */
  lowestOfHighest: number;
  cylinders: {
    reading: number;
    /** Below the average, per cent; less than zero where it lies above. */
    belowAverage: number;
    /** Against the band. */
    judged: Judged | null;
    /** Against the average. */
    average: Judged | null;
  }[];
  judged: { lowestOfHighest: Judged | null; difference: Judged | null };
  passes: boolean;
}

function ruleProblems({ band, lowestOfHighest, belowAverage, difference }: CompressionRules): FieldProblem[] {
  return [
    ...optionalBandProblems('rules.band', 'The compression allowed', band, PRESSURE),
    ...optionalBandProblems('rules.lowestOfHighest', 'The share of the highest', lowestOfHighest, TOLERANCE_PERCENT),
    ...optionalBandProblems('rules.belowAverage', 'The share below the average', belowAverage, TOLERANCE_PERCENT),
    ...optionalBandProblems('rules.difference', 'The difference between cylinders', difference, PRESSURE),
  ];
}

/**
 * Compression of all cylinders, by the rules that are given. Readings are gauge pressures; a share of absolute ones
 * would flatter a weak cylinder (see `atmosphere.ts`).
 *
 * Errors name `readings`, `readings.<place>` or `rules.<name>`; an engine that shows nothing at all names `readings`.
 */
export function judgeCompression(readings: readonly number[], rules: CompressionRules = {}): Worked<CompressionFound> {
  const problems = [
    ...listProblems('readings', { list: 'The compression readings', one: 'Cylinder' }, readings, PRESSURE, {
      atMost: 64,
    }),
    ...ruleProblems(rules),
  ];
  if (problems.length === 0 && largestOf(readings) === 0)
    problems.push({ field: 'readings', message: 'No cylinder shows any compression; check the gauge first.' });
  return work(problems, 'readings', () => found(readings, rules));
}

function found(readings: readonly number[], rules: CompressionRules): CompressionFound {
  const lowest = smallestOf(readings);
  const highest = largestOf(readings);
  const mean = meanOf(readings);
  const difference = rangeOf(readings);
  const lowestOfHighest = (100 * lowest) / highest;

  const cylinders = readings.map((reading) => {
    const belowAverage = (100 * (mean - reading)) / mean;
    return {
      reading,
      belowAverage,
      judged: placeInIfAny(reading, rules.band),
      average: placeInIfAny(belowAverage, rules.belowAverage, 100),
    };
  });
  const judged = {
    lowestOfHighest: placeInIfAny(lowestOfHighest, rules.lowestOfHighest),
    difference: placeInIfAny(difference, rules.difference, highest),
  };
  const passes = nothingFails([...Object.values(judged), ...cylinders.flatMap((one) => [one.judged, one.average])]);
  return { lowest, highest, mean, difference, lowestOfHighest, cylinders, judged, passes };
}
