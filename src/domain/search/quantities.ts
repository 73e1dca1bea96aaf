import { convert, type Unit } from '../measure/convert';
import { withUnit, formatNumber, inBothUnits } from '../measure/format';
import { NUMBER, numberOf, SPELLINGS } from '../measure/spellings';

/**
 * Reads measures out of what somebody types: a torque off an old wrench, a clearance in thou, a thread. People write
 * one unit in many ways (`measure/spellings.ts`); what is read is compared in the unit the book keeps.
 */

/** A measure met in a query. `low` and `high` are the least and most it can mean, in `unit`. */
export interface ReadMeasure {
  kind: 'measure';
  /** As typed: "89 lbf·in". */
  typed: string;
  value: number;
  low: number;
  high: number;
  /** Half of the last digit that was typed, in `unit`: 0.05 for 7.4. */
  halfDigit: number;
  unit: Unit;
  start: number;
  end: number;
}

/** A thread met in a query: "M6", or "M6×1.0" where the pitch was given too. */
export interface ReadThread {
  kind: 'thread';
  typed: string;
  thread: string;
  start: number;
  end: number;
}

export type ReadQuantity = ReadMeasure | ReadThread;

const AFTER = String.raw`(?![\p{L}\d])`;
const UNITS = SPELLINGS.map(([pattern], i) => `(?<u${i}>${pattern})`).join('|');
const MEASURE = new RegExp(
  String.raw`(?<![\p{L}\d.,/])(?<first>${NUMBER})(?:\s?(?:-|–|to)\s?(?<second>${NUMBER}))?[\s-]?(?:${UNITS})${AFTER}`,
  'giu',
);
const THREAD = /(?<![\p{L}\d])m ?(\d{1,2}(?:[.,]5)?)(?: ?[x×*] ?(\d(?:[.,]\d{1,2})?))?(?:[x×*]\d+)?(?![\p{L}\d])/giu;
const INCH_THREAD = /(?<![\p{L}\d])(#?\d{1,2}(?:\/\d{1,2})?) ?- ?(\d{1,2}) ?(un[cf])(?![\p{L}\d])/giu;

/** Half of the last digit written: 0.5 for "89", 0.05 for "7.4". */
function halfDigitOf(text: string): number {
  const decimals = /[.,](\d+)$/.exec(text)?.[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals;
}

function readMeasures(text: string): ReadMeasure[] {
  const found: ReadMeasure[] = [];
  for (const match of text.matchAll(MEASURE)) {
    const groups = match.groups ?? {};
    const which = SPELLINGS.findIndex((_, i) => groups[`u${i}`] !== undefined);
    const spelling = SPELLINGS[which];
    const first = groups.first ?? '';
    if (!spelling) continue;
    const [, unit, times = 1] = spelling;
    const low = numberOf(first) * times;
    const high = groups.second === undefined ? low : numberOf(groups.second) * times;
    if (!Number.isFinite(low) || !Number.isFinite(high) || high < low) continue;
    found.push({
      kind: 'measure',
      typed: match[0].trim(),
      value: (low + high) / 2,
      low,
      high,
      halfDigit: halfDigitOf(first) * times,
      unit,
      start: match.index,
      end: match.index + match[0].length,
    });
  }
  return found;
}

function readThreads(text: string): ReadThread[] {
  const metric = [...text.matchAll(THREAD)].map((match) => {
    const pitch = match[2]?.replace(',', '.');
    const name = `M${(match[1] ?? '').replace(',', '.')}`;
    return { match, thread: pitch ? `${name}×${pitch.includes('.') ? pitch : `${pitch}.0`}` : name };
  });
  const inches = [...text.matchAll(INCH_THREAD)].map((match) => ({
    match,
    thread: `${match[1] ?? ''}-${match[2] ?? ''} ${(match[3] ?? '').toUpperCase()}`,
  }));
  return [...metric, ...inches].map(({ match, thread }) => ({
    kind: 'thread',
    typed: match[0].trim(),
    thread,
    start: match.index,
    end: match.index + match[0].length,
  }));
}

/** All measures and threads of a query, in the order they stand. None overlap. */
export function readQuantities(text: string): ReadQuantity[] {
  const all = [...readThreads(text), ...readMeasures(text)].sort((a, b) => a.start - b.start);
  return all.filter((one, i) => all.slice(0, i).every((before) => before.end <= one.start));
}

/** Two measures agree where they lie within this share of each other; wider than any rounding of two digits and a half. */
const SHARE = 0.02;

/**
 * How well a value of the book answers a measure of the query: 1 where they are the same, falling to 0.5 at the
 * edge of what rounding explains, 0 beyond. Within ±2 %, or within the digits that were typed where
 * the two are in different units (10 N·m printed as 7 lbf·ft).
 *
 * @param value in `unit`, as the book keeps it
 */
export function agreement(read: ReadMeasure, value: number, unit: Unit): number {
  const low = convert(read.low, read.unit, unit);
  const high = convert(read.high, read.unit, unit);
  const digit = convert(read.value + read.halfDigit, read.unit, unit);
  const middle = convert(read.value, read.unit, unit);
  if (!low.ok || !high.ok || !digit.ok || !middle.ok) return 0;
  const rounding = read.unit === unit ? 0 : Math.abs(digit.value - middle.value);
  const margin = Math.max(SHARE * Math.abs(value), rounding, 1e-9);
  const away = Math.max(low.value - value, value - high.value, 0);
  if (away > margin * (1 + 1e-9)) return 0;
  return 1 - (0.5 * away) / margin;
}

/** What was read, in the reader's units and to as many digits as were typed: "10 N·m" for 89 lbf·in. */
export function sayQuantity(read: ReadQuantity, units: 'metric' | 'inch'): string {
  if (read.kind === 'thread') return read.thread;
  const { unit } = inBothUnits([read.high], read.unit)[units];
  const ends = read.low === read.high ? [read.value] : [read.low, read.high];
  const texts = ends.map((end) => {
    const converted = convert(end, read.unit, unit);
    const value = converted.ok ? converted.value : end;
    if (unit === read.unit) return formatNumber(value);
    const digits = String(Number((end / (2 * read.halfDigit)).toFixed(0))).length;
    return formatNumber(Number(value.toPrecision(Math.max(2, digits))));
  });
  return withUnit(texts.join(' to '), unit);
}
