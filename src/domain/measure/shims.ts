import { optionalBandProblems, placeInIfAny, sameWithin, type Band, type Judged } from './band';
import { GAP, OFFSET, SIZE } from './reach';
import { shimSizes, stockProblems, type ShimStock } from './shimStock';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export interface ShimReading {
  /** Shim that is in, m, by the micrometer. */
  old: number;
  /** Lash measured with it, m. */
  measured: number;
  /** Lash wanted, m. */
  target: number;
}

function readingProblems({ old, measured, target }: ShimReading): FieldProblem[] {
  const problems = [
    ...numberProblem('old', 'The shim that is in', old, SIZE),
    ...numberProblem('measured', 'The lash measured', measured, GAP),
    ...numberProblem('target', 'The lash wanted', target, GAP),
  ];
  if (problems.length === 0 && old + measured - target <= 0)
    problems.push({ field: 'target', message: 'The lash wanted leaves no thickness for a shim.' });
  return problems;
}

/**
 * The shim that gives the lash wanted, m: old + measured − wanted. Source: N = T + (A − V), quoted from a service manual.
 * More lash than wanted asks for a thicker shim. Errors name `old`, `measured` or `target`.
 */
export const exactShim = (reading: ShimReading): Worked<number> =>
  work(readingProblems(reading), 'old', () => reading.old + reading.measured - reading.target);

/** The lash that a shim of this thickness would give, m; less than zero holds the valve open. */
export const lashWith = (shim: number, old: number, measured: number): Worked<number> =>
  work(
    [
      ...numberProblem('shim', 'The shim', shim, SIZE),
      ...numberProblem('old', 'The shim that is in', old, SIZE),
      ...numberProblem('measured', 'The lash measured', measured, GAP),
    ],
    'shim',
    () => old + measured - shim,
  );

export interface ShimChoice extends ShimReading {
  stock: ShimStock;
  /** Lash allowed, m; each neighbour's lash is judged by it. */
  band?: Band;
}

export interface ShimFound {
  thickness: number;
  /** Lash it would give, m. */
  lash: number;
  judged: Judged | null;
}

export interface ShimChosen {
  exact: number;
  /**
   * The stocked sizes next to it, thinner first; one where a size fits exactly or the answer lies outside the stock.
   */
  neighbours: ShimFound[];
  /** The nearest of them; of two that are equally near the thinner, which leaves more lash and not less. */
  chosen: ShimFound;
  /** Where the exact answer lies beyond every size there is: look for a sunk valve or a cut stem first. */
  outside: 'thinner than the stock' | 'thicker than the stock' | null;
}

/**
 * The shim to fit from what is in stock, with the lash that each neighbour gives.
 *
 * Errors name `old`, `measured`, `target`, `stock`, `stock.<place>`, `stock.<min|max|step>` or `band`.
 */
export const chooseShim = (choice: ShimChoice): Worked<ShimChosen> =>
  work(
    [
      ...readingProblems(choice),
      ...stockProblems(choice.stock),
      ...optionalBandProblems('band', 'The lash allowed', choice.band, OFFSET),
    ],
    'old',
    () => chosenFrom(choice, shimSizes(choice.stock)),
  );

function chosenFrom({ old, measured, target, band }: ShimChoice, sizes: readonly number[]): ShimChosen {
  const exact = old + measured - target;
  const found = (thickness: number): ShimFound => {
    const lash = old + measured - thickness;
    return { thickness, lash, judged: placeInIfAny(lash, band, old) };
  };
  const thinner = sizes.filter((size) => size <= exact || sameWithin(size, exact)).at(-1);
  const thicker = sizes.find((size) => size >= exact || sameWithin(size, exact));
  const neighbours = [...new Set([thinner, thicker])].flatMap((size) => (size === undefined ? [] : found(size)));
  const [first, second] = neighbours as [ShimFound, ShimFound?];
  const far = (shim: ShimFound) => Math.abs(shim.thickness - exact);
  const secondIsNearer =
    second !== undefined && far(second) < far(first) && !sameWithin(far(second), far(first), exact);
  return {
    exact,
    neighbours,
    chosen: secondIsNearer ? second : first,
    outside: thinner === undefined ? 'thinner than the stock' : thicker === undefined ? 'thicker than the stock' : null,
  };
}
