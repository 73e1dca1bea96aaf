import { fromBase, type Unit } from './convert';
import { formatMeasure, type BothUnits } from './format';

/** Sentences and formulas with measures in them, written once for readers of both unit systems. */

type Part = BothUnits | string | number;

const partIn = (part: Part | undefined, system: 'metric' | 'inch'): string =>
  part === undefined ? '' : typeof part === 'object' ? part[system] : String(part);

/** A sentence in both unit systems: said`The gap is ${show(gap, 'mm', 0.01)}.` */
export function said(words: TemplateStringsArray, ...parts: Part[]): BothUnits {
  const write = (system: 'metric' | 'inch') => words.map((word, i) => word + partIn(parts[i], system)).join('');
  return { metric: write('metric'), inch: write('inch') };
}

/**
 * A measure as both readers see it.
 *
 * @param base in the base unit of its kind, finite
 * @param unit that a metric bench reads it in
 * @param fineness the step to round to, in `unit`
 */
export const show = (base: number, unit: Unit, fineness?: number): BothUnits =>
  // Twelve digits: more than any tool, fewer than the slips of binary numbers (0.35 mm is 0.35000000000000003).
  formatMeasure(Number(fromBase(base, unit).toPrecision(12)), unit, fineness);
