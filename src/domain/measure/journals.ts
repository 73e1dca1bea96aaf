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
import { SIZE } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export interface Journal {
  /** Two or three places, front first; at each the diameter on two axes a quarter turn apart, m. */
  readings: DiameterGrid;
  /** Distance between the first place and the last, m; needed where taper is limited for a length. */
  length?: number;
  limits?: ShapeLimits & {
    /** Taper in m for each m of length: 0.0025 mm in 25.4 mm is 0.0025 / 25.4. */
    taperPerLength?: Band;
  };
}

export interface JournalFound extends Shape {
  /** Taper for each metre of length; null where no length was given. */
  taperPerLength: number | null;
  judged: ShapeJudged & { taperPerLength: Judged | null };
  passes: boolean;
}

function lengthProblems({ length, limits }: Journal): FieldProblem[] {
  const most = limits?.taperPerLength;
  return [
    ...(length === undefined ? [] : numberProblem('length', 'The length between the readings', length, SIZE)),
    ...optionalBandProblems('limits.taperPerLength', 'The taper allowed for a length', most, { least: 0, most: 1 }),
    ...(most !== undefined && length === undefined
      ? [{ field: 'length', message: 'A taper for a length needs the length between the readings.' }]
      : []),
  ];
}

/**
 * Taper and out-of-round of a crankshaft journal. Taper is front against rear on one axis, out-of-round the two axes at
 * one place. Sources: TM 5-3805-262-34 p. 4-24; taper for a length: TM 5-3805-281-24-2.
 *
 * Errors name `readings`, `readings.<place>.<axis>`, `length` or `limits.<name>`.
 */
export const judgeJournal = (journal: Journal): Worked<JournalFound> =>
  work(
    [
      ...gridProblems('readings', { list: 'The journal', one: 'Place' }, journal.readings),
      ...lengthProblems(journal),
      ...shapeLimitProblems(journal.limits),
    ],
    'readings',
    () => {
      const shape = shapeOf(journal.readings);
      const { length, limits } = journal;
      const most = limits?.taperPerLength;
      const taperPerLength = length === undefined ? null : shape.worstTaper / length;
      const judged = {
        ...judgeShape(shape, limits),
        taperPerLength:
          taperPerLength === null || length === undefined || most === undefined
            ? null
            : placeInIfAny(taperPerLength, most, shape.largest / length),
      };
      return { ...shape, taperPerLength, judged, passes: nothingFails(Object.values(judged)) };
    },
  );
