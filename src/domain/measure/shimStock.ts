import { SIZE } from './reach';
import { listProblems } from './readings';
import { numberProblem, type FieldProblem } from './worked';

/** Sizes in stock, m: each of them, or from least to greatest in equal steps. */
export type ShimStock = readonly number[] | { min: number; max: number; step: number };

const MOST_SIZES = 1000;

const isList = (stock: ShimStock): stock is readonly number[] => Array.isArray(stock);
/** Steps that fit into the range; the tiny addition keeps 0.8 / 0.05 from losing its last step. */
const stepsIn = (min: number, max: number, step: number) => Math.floor((max - min) / step + 1e-6);

/** Problems named `stock`, `stock.<place>` or `stock.<min|max|step>`. */
export function stockProblems(stock: ShimStock): FieldProblem[] {
  if (typeof stock !== 'object' || stock === null)
    return [{ field: 'stock', message: 'The stock must be a list of sizes, or a range with a step.' }];
  if (isList(stock))
    return listProblems('stock', { list: 'The stock', one: 'Size' }, stock, SIZE, { atMost: MOST_SIZES });
  const { min, max, step } = stock;
  const problems = [
    ...numberProblem('stock.min', 'The thinnest shim in stock', min, SIZE),
    ...numberProblem('stock.max', 'The thickest shim in stock', max, SIZE),
    ...numberProblem('stock.step', 'The step between shims', step, SIZE),
  ];
  if (problems.length > 0) return problems;
  if (max < min)
    return [{ field: 'stock.max', message: 'The thickest shim in stock cannot be thinner than the thinnest.' }];
  if (stepsIn(min, max, step) >= MOST_SIZES)
    return [{ field: 'stock.step', message: 'The step between shims is too small for this range.' }];
  return [];
}

/** Every size of a stock that was checked, thinnest first, each once. */
export function shimSizes(stock: ShimStock): number[] {
  if (isList(stock)) return [...new Set(stock)].sort((a, b) => a - b);
  const { min, max, step } = stock;
  return Array.from({ length: stepsIn(min, max, step) + 1 }, (_, place) => min + place * step);
}
