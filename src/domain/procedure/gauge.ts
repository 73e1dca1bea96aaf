import { fromBase, isUnit, quantityOf, toBase, type Unit } from '../measure/convert';
import { inchUnit, formatNumber, withUnit, type BothUnits } from '../measure/format';
import { gaugeFit, gaugeFor, IDEAL_RATIO } from '../measure/gaugeFit';
import type { Limit } from './schema';

/** The tool that is fine enough for a limit of a sheet. */

/**
 * The whole tolerance of a limit, as two ends in its unit. A length that only has a most (an out-of-round, an end play)
 * has zero for its other end; whatever else has one end has no tolerance to divide.
 */
function ends({ unit, min, max }: Limit): { unit: Unit; min: number; max: number } | null {
  if (!unit || !isUnit(unit) || max === undefined) return null;
  const least = min ?? (quantityOf(unit) === 'length' && max > 0 ? 0 : undefined);
  return least !== undefined && max > least ? { unit, min: least, max } : null;
}

/** The largest of 1, 2, 5 and their tens that is no more than `most`: how scales and digits are divided. */
function division(most: number): number {
  const decade = 10 ** Math.floor(Math.log10(most) + 1e-9);
  const step = [5, 2, 1].find((times) => times * decade <= most * (1 + 1e-9)) ?? 1;
  return Number((step * decade).toPrecision(1));
}

/** "0.01 mm" and "0.0005 in": what to read a limit to, ten steps to its tolerance; null where it has none. */
export function gaugeText(limit: Limit): BothUnits | null {
  const found = ends(limit);
  if (!found) return null;
  const [low, high] = [toBase(found.min, found.unit), toBase(found.max, found.unit)];
  if (!low.ok || !high.ok) return null;
  if (quantityOf(found.unit) === 'length') {
    const marked = (unit: 'mm' | 'in') => {
      const choice = gaugeFor(high.value - low.value, unit);
      return choice.ok ? (choice.value.ideal ?? choice.value.least)?.text : undefined;
    };
    const [metric, inch] = [marked('mm'), marked('in')];
    return metric && inch ? { metric, inch } : null;
  }
  const steps = (unit: Unit) => {
    const band = fromBase(high.value, unit) - fromBase(low.value, unit);
    return withUnit(formatNumber(division(band / IDEAL_RATIO)), unit);
  };
  return { metric: steps(found.unit), inch: steps(inchUnit(found.unit, found.max)) };
}

/**
 * Why the tool that a limit names is too coarse for it, in a sentence; null where it is fine enough or none is named.
 * A limit with one end may be a feeler that goes or does not go, so only two ends are judged.
 */
export function coarseTool(limit: Limit): string | null {
  const found = ends(limit);
  if (!found || limit.min === undefined || limit.resolution === undefined) return null;
  const fit = gaugeFit(found.max - found.min, limit.resolution);
  if (!fit.ok || fit.value.verdict !== 'too coarse') return null;
  return `Fewer than four steps of ${withUnit(formatNumber(limit.resolution), found.unit)} fit into this tolerance; a reading near its end is a guess.`;
}

/** Why the tool that a limit names cannot show one of its ends, in a sentence; null where it can. */
export function betweenSteps({ unit, min, nominal, max, resolution }: Limit): string | null {
  if (resolution === undefined || !unit || !isUnit(unit)) return null;
  const off = [min, nominal, max].find(
    (value) => value !== undefined && Math.abs(value / resolution - Math.round(value / resolution)) > 1e-6,
  );
  if (off === undefined) return null;
  const text = (value: number) => withUnit(formatNumber(value), unit);
  return `${text(off)} lies between two steps of a tool that reads to ${text(resolution)}.`;
}
