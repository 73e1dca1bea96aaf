import { nothingFails, optionalBandProblems, placeIn, placeInIfAny, type Band, type Judged } from './band';
import { PRESSURE, SHARE_PERCENT } from './reach';
import { largestOf, listProblems, meanOf, rangeOf, smallestOf } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** Each rule is used where it is given. They come from different books and do not agree; the sheet says which holds. */
export interface CompressionRules {
  /** Every cylinder, Pa. */
  band?: Band;
  /** Lowest as a share of the highest, per cent. 75: TM 5-4210-230-14&P-1 Add. 2. */
  lowestOfHighest?: number;
  /** How far a cylinder may lie below the average of all, per cent. 20: TM 1-1500-204-23-1 (aircraft). */
  belowAverage?: number;
  /** Largest difference between two cylinders, Pa. 10 psi: TM 10-3930-618-20. */
  difference?: number;
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
  const given = (value: number | undefined, problems: (value: number) => FieldProblem[]) =>
    value === undefined ? [] : problems(value);
  return [
    ...optionalBandProblems('rules.band', 'The compression allowed', band, PRESSURE),
    ...given(lowestOfHighest, (share) =>
      numberProblem('rules.lowestOfHighest', 'The least share of the highest', share, SHARE_PERCENT),
    ),
    ...given(belowAverage, (share) =>
      numberProblem('rules.belowAverage', 'The share below the average', share, SHARE_PERCENT),
    ),
    ...given(difference, (most) =>
      numberProblem('rules.difference', 'The difference between cylinders', most, PRESSURE),
    ),
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
  const most = (max: number | undefined) => (max === undefined ? undefined : { max });

  const cylinders = readings.map((reading) => {
    const belowAverage = (100 * (mean - reading)) / mean;
    return {
      reading,
      belowAverage,
      judged: placeInIfAny(reading, rules.band),
      average: placeInIfAny(belowAverage, most(rules.belowAverage), 100),
    };
  });
  const judged = {
    lowestOfHighest:
      rules.lowestOfHighest === undefined ? null : placeIn(lowestOfHighest, { min: rules.lowestOfHighest }),
    difference: placeInIfAny(difference, most(rules.difference), highest),
  };
  const passes = nothingFails([...Object.values(judged), ...cylinders.flatMap((one) => [one.judged, one.average])]);
  return { lowest, highest, mean, difference, lowestOfHighest, cylinders, judged, passes };
}
