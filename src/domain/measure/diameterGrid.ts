import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { GAP, SIZE } from './reach';
import { countProblem, largestOf, listProblems, rangeOf, smallestOf, type Called } from './readings';
import type { FieldProblem } from './worked';

/**
 * Diameters in m at two or three places along a bore or a journal, first place to last, each on two axes a quarter turn
 * apart: `[[thrust, along], [thrust, along]]`.
 */
export type DiameterGrid = readonly (readonly number[])[];

export interface Shape {
  smallest: number;
  largest: number;
  /** Difference of the two axes at each place. */
  outOfRound: number[];
  worstOutOfRound: number;
  /** First place less last place on each axis; positive where the first is larger. */
  taper: number[];
  /** The larger of them without its sign. */
  worstTaper: number;
  /** Largest less smallest on each axis, over all its places. */
  axisRange: number[];
  /** What some manuals call cylindricity: the larger of the axes' ranges. */
  cylindricity: number;
}

export interface ShapeLimits {
  /** Of every reading, m. */
  diameter?: Band;
  taper?: Band;
  outOfRound?: Band;
  cylindricity?: Band;
}

export interface ShapeJudged {
  /** The reading that is worst off: the smallest where it is under, else the largest. */
  diameter: Judged | null;
  taper: Judged | null;
  outOfRound: Judged | null;
  cylindricity: Judged | null;
}

/** Problems named `<field>`, `<field>.<place>` or `<field>.<place>.<axis>`. */
export function gridProblems(field: string, called: Called, grid: DiameterGrid): FieldProblem[] {
  const count = countProblem(field, called, grid, { atLeast: 2, atMost: 3 });
  if (count.length > 0) return count;
  return Array.from(grid).flatMap((place, row) => {
    const inWords = { list: `${called.one} ${row + 1}`, one: `${called.one} ${row + 1}, axis` };
    const two = countProblem(`${field}.${row}`, { ...inWords, one: 'Reading' }, place, { atLeast: 2, atMost: 2 });
    return two.length > 0 ? two : listProblems(`${field}.${row}`, inWords, place, SIZE);
  });
}

export function shapeLimitProblems(limits: ShapeLimits | undefined): FieldProblem[] {
  const { diameter, taper, outOfRound, cylindricity } = limits ?? {};
  return [
    ...optionalBandProblems('limits.diameter', 'The diameter allowed', diameter, SIZE),
    ...optionalBandProblems('limits.taper', 'The taper allowed', taper, GAP),
    ...optionalBandProblems('limits.outOfRound', 'The out-of-round allowed', outOfRound, GAP),
    ...optionalBandProblems('limits.cylindricity', 'The cylindricity allowed', cylindricity, GAP),
  ];
}

/**
 * Taper and out-of-round of a grid that was checked. Taper is taken on one axis between the first place and the last;
 * out-of-round at one place between the axes (small-engine service manual, quoted). Cylindricity is the largest of
 * (max − min) on one axis (diesel service manual, quoted), a difference of diameters, not the radial zone of ISO 1101.
 */
export function shapeOf(grid: DiameterGrid): Shape {
  const axes = [0, 1].map((axis) => grid.map((place) => place[axis] ?? NaN));
  const all = axes.flat();
  const outOfRound = grid.map(rangeOf);
  const taper = axes.map((axis) => (axis[0] ?? NaN) - (axis.at(-1) ?? NaN));
  const axisRange = axes.map(rangeOf);
  return {
    smallest: smallestOf(all),
    largest: largestOf(all),
    outOfRound,
    worstOutOfRound: largestOf(outOfRound),
    taper,
    worstTaper: largestOf(taper.map(Math.abs)),
    axisRange,
    cylindricity: largestOf(axisRange),
  };
}

/** Each of the limits that is given, judged; differences are forgiven the rounding of the diameters. */
export function judgeShape(shape: Shape, limits: ShapeLimits = {}): ShapeJudged {
  const { smallest, largest } = shape;
  const least = placeInIfAny(smallest, limits.diameter);
  return {
    diameter: least?.at === 'under' ? least : placeInIfAny(largest, limits.diameter),
    taper: placeInIfAny(shape.worstTaper, limits.taper, largest),
    outOfRound: placeInIfAny(shape.worstOutOfRound, limits.outOfRound, largest),
    cylindricity: placeInIfAny(shape.cylindricity, limits.cylindricity, largest),
  };
}
