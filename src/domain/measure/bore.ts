import { nothingFails, optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import {
  gridProblems,
  judgeShape,
  shapeLimitProblems,
  shapeOf,
  type DiameterGrid,
  type Shape,
  type ShapeJudged,
  type ShapeLimits,
} from './diameterGrid';
import { OFFSET, SIZE } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export interface Bore {
  /** Two or three heights, top first; at each the diameter across the thrust faces and along the crankshaft, m. */
  readings: DiameterGrid;
  /** Size of the new bore, m; wear is counted from it. */
  nominal?: number;
  /** Diameter of the piston that runs in it, m, measured where its maker says. */
  piston?: number;
  limits?: ShapeLimits & {
    /** Of the piston in the bore, m; needs the piston. */
    clearance?: Band;
  };
}

export interface BoreFound extends Shape {
  /** Largest reading less nominal, m; negative in a bore under size. Null without a nominal size. */
  wear: number | null;
  /** From the smallest and from the largest reading, m; less than zero where the piston does not go in. */
  clearance: { least: number; greatest: number } | null;
  judged: ShapeJudged & {
    /** Of the smallest reading less the piston, as sheets state it. */
    clearance: Judged | null;
  };
  passes: boolean;
}

function clearanceProblems({ limits, piston }: Bore): FieldProblem[] {
  const called = 'The piston clearance allowed';
  const problems = optionalBandProblems('limits.clearance', called, limits?.clearance, OFFSET);
  if (limits?.clearance !== undefined && piston === undefined)
    problems.push({ field: 'piston', message: 'The piston clearance needs the diameter of the piston.' });
  return problems;
}

/**
 * Taper, out-of-round, cylindricity, wear and piston clearance of one bore, each judged where a limit is given. Which
 * of taper (top against bottom) and cylindricity (largest against smallest on one axis) a sheet means is for its
 * author to say; with two heights they are the same number. Sources: TM 9-2815-202-34 p. 4-147 for taper by two
 * heights; `diameterGrid.ts` for the rest. Clearance is geometry.
 *
 * Errors name `readings`, `readings.<height>.<axis>`, `nominal`, `piston` or `limits.<name>`.
 */
export const judgeBore = (bore: Bore): Worked<BoreFound> =>
  work(
    [
      ...gridProblems('readings', { list: 'The bore', one: 'Height' }, bore.readings),
      ...(bore.nominal === undefined ? [] : numberProblem('nominal', 'The nominal bore', bore.nominal, SIZE)),
      ...(bore.piston === undefined ? [] : numberProblem('piston', 'The piston', bore.piston, SIZE)),
      ...shapeLimitProblems(bore.limits),
      ...clearanceProblems(bore),
    ],
    'readings',
    () => found(bore),
  );

function found({ readings, nominal, piston, limits }: Bore): BoreFound {
  const shape = shapeOf(readings);
  const { smallest, largest } = shape;
  const clearance = piston === undefined ? null : { least: smallest - piston, greatest: largest - piston };
  const judged = {
    ...judgeShape(shape, limits),
    clearance: clearance && placeInIfAny(clearance.least, limits?.clearance, largest),
  };
  return {
    ...shape,
    wear: nominal === undefined ? null : largest - nominal,
    clearance,
    judged,
    passes: nothingFails(Object.values(judged)),
  };
}
