import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { OFFSET, SIZE } from './reach';
import { largestOf, listProblems, meanOf, smallestOf } from './readings';
import { work, type FieldProblem, type Worked } from './worked';

export interface Clearance {
  /** Smallest bore less largest journal, m; less than zero where the shaft is gripped. */
  least: number;
  /** Largest bore less smallest journal, m. */
  greatest: number;
  /** Mean bore less mean journal, m. */
  mean: number;
  /** The end that is worst off: the least where it is under, else the greatest. */
  judged: Judged | null;
}

function clearanceOf(bores: readonly number[], journals: readonly number[], band: Band | undefined): Clearance {
  const least = smallestOf(bores) - largestOf(journals);
  const greatest = largestOf(bores) - smallestOf(journals);
  const size = largestOf(bores);
  const judgedLeast = placeInIfAny(least, band, size);
  return {
    least,
    greatest,
    mean: meanOf(bores) - meanOf(journals),
    judged: judgedLeast?.at === 'under' ? judgedLeast : placeInIfAny(greatest, band, size),
  };
}

const listOf = (field: string, list: string, one: string, values: readonly number[]): FieldProblem[] =>
  listProblems(field, { list, one }, values, SIZE, { atMost: 12 });

export interface MeasuredBearing {
  /** Inside diameters of the bearing with its shells in and its cap tightened in full, in line with the bolts, m. */
  bore: readonly number[];
  /** Outside diameters of the journal, m. */
  journal: readonly number[];
  band?: Band;
}

/**
 * Oil clearance as measured: inside diameter of the bearing less outside diameter of its journal, one reading of each or more.
 * Source: TM 9-2815-254-24 §f (cap torqued, measured vertically).
 *
 * Errors name `bore.<place>`, `journal.<place>`, the list that is empty, or `band`.
 */
export const bearingClearance = ({ bore, journal, band }: MeasuredBearing): Worked<Clearance> =>
  work(
    [
      ...listOf('bore', 'The bearing bores', 'Bearing bore', bore),
      ...listOf('journal', 'The journals', 'Journal', journal),
      ...optionalBandProblems('band', 'The oil clearance allowed', band, OFFSET),
    ],
    'bore',
    () => clearanceOf(bore, journal, band),
  );

export interface BuiltBearing {
  /** Bores of the housing without shells, cap tightened in full, m. */
  housing: readonly number[];
  /** Wall of each shell at its middle, m; the two halves of one bearing, or one that stands for both. */
  shell: readonly number[];
  journal: readonly number[];
  band?: Band;
}

/**
 * Oil clearance before the shells are in: housing bore less both shell walls less journal. Geometry (from memory); the
 * crush of the shells is left out, so it is a forecast, and the measured clearance has the last word.
 *
 * Errors name `housing.<place>`, `shell.<place>`, `journal.<place>`, the list that is empty, or `band`.
 */
export function clearanceFromShells({ housing, shell, journal, band }: BuiltBearing): Worked<Clearance> {
  const problems = [
    ...listOf('housing', 'The housing bores', 'Housing bore', housing),
    ...listProblems('shell', { list: 'The shell walls', one: 'Shell wall' }, shell, SIZE, { atMost: 2 }),
    ...listOf('journal', 'The journals', 'Journal', journal),
    ...optionalBandProblems('band', 'The oil clearance allowed', band, OFFSET),
  ];
  const bores = () => housing.map((bore) => bore - 2 * meanOf(shell));
  if (problems.length === 0 && smallestOf(bores()) <= 0)
    problems.push({ field: 'shell', message: 'The shell walls fill the whole housing bore.' });
  return work(problems, 'housing', () => clearanceOf(bores(), journal, band));
}
