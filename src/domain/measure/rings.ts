import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { GAP, OFFSET, SIZE } from './reach';
import { largestOf, listProblems, smallestOf } from './readings';
import { numberProblem, work, type Worked } from './worked';

export interface RingGaps {
  /** End gap of each ring, square in its own bore, m. */
  gaps: readonly number[];
  band?: Band;
}

export interface RingGapsFound {
  gaps: { gap: number; judged: Judged | null }[];
  smallest: number;
  largest: number;
  passes: boolean;
}

/**
 * Ring end gaps, each against the limit. Where one is under, `by` is what must be filed off its ends; one that is over
 * cannot be mended.
 *
 * Errors name `gaps`, `gaps.<place>` or `band`.
 */
export const judgeRingGaps = ({ gaps, band }: RingGaps): Worked<RingGapsFound> =>
  work(
    [
      ...listProblems('gaps', { list: 'The end gaps', one: 'End gap' }, gaps, GAP),
      ...optionalBandProblems('band', 'The end gap allowed', band, GAP),
    ],
    'gaps',
    () => {
      const found = gaps.map((gap) => ({ gap, judged: placeInIfAny(gap, band) }));
      const passes = found.every(({ judged }) => judged === null || judged.at === 'in');
      return { gaps: found, smallest: smallestOf(gaps), largest: largestOf(gaps), passes };
    },
  );

/** A gap of a tenth of the bore is no piston ring; the factor was meant in thousandths. */
const FACTOR = { above: 0, most: 0.1 };

/**
 * The end gap that a ring maker asks for by a factor of the bore, m: 4.00 in · 0.0040 is 0.016 in. The factor comes
 * from the maker of the ring for the use of the engine; none is built in. Source: a forum's quotation of a ring maker's table.
 *
 * @param bore m
 * @param factor gap for each unit of bore, the same number in mm and in inches
 */
export const gapByFactor = (bore: number, factor: number): Worked<number> =>
  work(
    [...numberProblem('bore', 'The bore', bore, SIZE), ...numberProblem('factor', 'The factor', factor, FACTOR)],
    'bore',
    () => bore * factor,
  );

/** The factor that a gap is of its bore; `gapByFactor` the other way round. */
export const factorOfGap = (gap: number, bore: number): Worked<number> =>
  work(
    [...numberProblem('gap', 'The end gap', gap, GAP), ...numberProblem('bore', 'The bore', bore, SIZE)],
    'gap',
    () => gap / bore,
  );

/**
 * How much a ring's end gap opens when its bore grows by `boreChange`, m: π · Δbore, because the ring lies along the
 * circumference. Less than zero where the bore is smaller. Geometry. TM 5-3825-229-14&P prints 0.0031 in for 0.0012 in,
 * which is not π times: 0.0038 in is right.
 */
export const gapChange = (boreChange: number): Worked<number> =>
  work(
    numberProblem('boreChange', 'The change of the bore', boreChange, OFFSET),
    'boreChange',
    () => Math.PI * boreChange,
  );

export interface GapElsewhere {
  /** End gap as it was measured, m. */
  gap: number;
  /** Bore or setting ring that it was measured in, m. */
  measuredIn: number;
  /** Bore that it will run in, m. */
  runsIn: number;
}

/**
 * The end gap that a ring will have in another bore than the one it was measured in, m. Less than zero means that its
 * ends meet: the ring does not fit.
 *
 * Errors name `gap`, `measuredIn` or `runsIn`.
 */
export const gapElsewhere = ({ gap, measuredIn, runsIn }: GapElsewhere): Worked<number> =>
  work(
    [
      ...numberProblem('gap', 'The end gap', gap, GAP),
      ...numberProblem('measuredIn', 'The bore that the gap was measured in', measuredIn, SIZE),
      ...numberProblem('runsIn', 'The bore that the ring will run in', runsIn, SIZE),
    ],
    'gap',
    () => gap + Math.PI * (runsIn - measuredIn),
  );
