import { optionalBandProblems, placeIn, placeInIfAny, type Band, type Judged } from './band';
import { GAP, SIZE } from './reach';
import { countProblem } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export const DIRECTIONS = ['along', 'across', 'diagonal'] as const;
export type Direction = (typeof DIRECTIONS)[number];

export interface EdgeGap {
  direction: Direction;
  /** Thickest blade that goes under the straightedge there, m; 0 where none goes. */
  gap: number;
  /** Distance between the two places on which the straightedge rests, m; needed for a limit in a length. */
  span?: number;
}

export interface FlatnessLimits {
  /** By the direction, m. */
  along?: Band;
  across?: Band;
  diagonal?: Band;
  /** Most in any stretch of a length, m: 0.05 mm in 150 mm. */
  local?: { max: number; over: number };
}

/** `unsure`: too much over a longer span than the limit's, so a shorter straightedge must tell. */
export type LocalVerdict = 'in' | 'over' | 'unsure';

export interface FlatnessFound {
  gaps: { gap: number; judged: Judged | null; local: LocalVerdict | null }[];
  /** Largest gap in each direction, m; null where none was measured. */
  worst: Record<Direction, number | null>;
  /** Largest of all. */
  worstOfAll: number;
  /** Every limit was met; a gap that is `unsure` does not pass. */
  passes: boolean;
}

function gapProblems({ direction, gap, span }: EdgeGap, place: number, spanNeeded: boolean): FieldProblem[] {
  const at = `gaps.${place}`;
  return [
    ...(DIRECTIONS.includes(direction)
      ? []
      : [{ field: `${at}.direction`, message: `Gap ${place + 1} must lie along, across or diagonally.` }]),
    ...numberProblem(`${at}.gap`, `Gap ${place + 1}`, gap, GAP),
    ...(span === undefined && !spanNeeded
      ? []
      : numberProblem(`${at}.span`, `The span of gap ${place + 1}`, span, SIZE)),
  ];
}

function limitProblems(limits: FlatnessLimits): FieldProblem[] {
  const { local } = limits;
  return [
    ...DIRECTIONS.flatMap((direction) => {
      const called = `The limit ${direction === 'diagonal' ? 'diagonally' : direction}`;
      return optionalBandProblems(`limits.${direction}`, called, limits[direction], GAP);
    }),
    ...(local === undefined
      ? []
      : [
          ...numberProblem('limits.local.max', 'The limit in a length', local.max, GAP),
          ...numberProblem('limits.local.over', 'The length of the limit', local.over, SIZE),
        ]),
  ];
}

/**
 * A limit in a length holds for every stretch of that length. Between two rests the face lies no lower than the gap, so
 * a gap within the limit passes at any span, and one beyond it fails where the span is no longer than the limit's.
 */
function localVerdict({ gap, span = Infinity }: EdgeGap, { max, over }: { max: number; over: number }): LocalVerdict {
  if (placeIn(gap, { max }).at === 'in') return 'in';
  return placeIn(span, { max: over }).at === 'in' ? 'over' : 'unsure';
}

/**
 * Flatness of a face by straightedge and feeler gauge: each gap against the limit of its direction and against a limit
 * in a length, and the worst of each. Geometry; the way of measuring is common practice, no source.
 *
 * Errors name `gaps`, `gaps.<place>.<direction|gap|span>` or `limits.<name>`.
 */
export function judgeFlatness(gaps: readonly EdgeGap[], limits: FlatnessLimits = {}): Worked<FlatnessFound> {
  const count = countProblem('gaps', { list: 'The gaps', one: 'Gap' }, gaps);
  const problems = [
    ...count,
    ...(count.length > 0
      ? []
      : Array.from(gaps).flatMap((gap, place) => gapProblems(gap ?? {}, place, limits.local !== undefined))),
    ...limitProblems(limits),
  ];
  return work(problems, 'gaps', () => found(gaps, limits));
}

function found(gaps: readonly EdgeGap[], limits: FlatnessLimits): FlatnessFound {
  const each = gaps.map((one) => {
    return {
      gap: one.gap,
      judged: placeInIfAny(one.gap, limits[one.direction]),
      local: limits.local === undefined ? null : localVerdict(one, limits.local),
    };
  });
  const worstOf = (direction: Direction) => {
    const found = gaps.filter((one) => one.direction === direction).map((one) => one.gap);
    return found.length === 0 ? null : Math.max(...found);
  };
  return {
    gaps: each,
    worst: { along: worstOf('along'), across: worstOf('across'), diagonal: worstOf('diagonal') },
    worstOfAll: Math.max(...gaps.map((one) => one.gap)),
    passes: each.every(({ judged, local }) => (judged?.at ?? 'in') === 'in' && (local ?? 'in') === 'in'),
  };
}
