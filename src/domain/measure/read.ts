import { isUnit, quantityOf, sameKind, toBase, type Unit, type UnitQuantity } from './convert';
import { withUnit } from './format';
import { NUMBER, numberOf, SPELLINGS, WORKSHEET_SPELLINGS } from './spellings';

/** A measure as somebody typed it into a box. */
export interface Typed {
  /** In the base unit of its kind (m, N·m, Pa, …). */
  base: number;
  /** As it was typed: 14 and `thou` for "14 thou". */
  amount: number;
  unit: Unit;
  /** Whether the unit stood in the text; else it is the box's own. */
  named: boolean;
}

export type ReadTyped = { ok: true; value: Typed } | { ok: false; message: string };

const refuse = (message: string): { ok: false; message: string } => ({ ok: false, message });

/** Fractions that keyboards and rulers give: ½ is read as 1/2. */
const FRACTIONS: Readonly<Record<string, string>> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
};
const plain = (text: string): string =>
  text
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => ` ${FRACTIONS[sign] ?? ''}`)
    .replace(/[−–—]/g, '-')
    .replace(/\s+/g, ' ')
    .trim();

const MEASURE = new RegExp(
  String.raw`^(?<sign>[-+]?) ?(?:(?:(?<whole>\d{1,4})[ -])?(?<over>\d{1,4})/(?<under>\d{1,4})|(?<number>\d+(?:\.\d+)?e[-+]?\d{1,3}|${NUMBER}))\.?(?<unit>.*)$`,
  'iu',
);

const UNITS = [...SPELLINGS, ...WORKSHEET_SPELLINGS].map(([pattern, unit, times = 1]) => ({
  is: new RegExp(`^(?:${pattern})$`, 'iu'),
  unit,
  times,
}));

/**
 * The unit that a text names, and how many of it one is (a cm is ten mm); null where the book knows none. Where a word
 * names two units, such as the pound of force and the pound of mass, the one that measures `wanted` is meant.
 */
export function readUnit(text: string, wanted?: UnitQuantity): { unit: Unit; times: number } | null {
  // "in." is written as often as "in".
  const bare = text.replace(/^-(?=\p{L})|(?<=\p{L})\.$/gu, '').trim();
  const named = UNITS.flatMap(({ is, unit, times }) => (is.test(bare) ? [{ unit, times }] : []));
  if (isUnit(bare)) named.push({ unit: bare, times: 1 });
  return named.find(({ unit }) => quantityOf(unit) === wanted) ?? named[0] ?? null;
}

interface Parsed {
  amount: number;
  /** As the text names it, null for a bare number. `times` is already in the amount. */
  unit: Unit | null;
}

function parse(
  text: string,
  instead: string,
  wanted?: UnitQuantity,
): { ok: true; value: Parsed } | { ok: false; message: string } {
  const groups = MEASURE.exec(plain(text))?.groups;
  if (!groups) return refuse(`"${text.trim().slice(0, 40)}" is no number. Write, for example, ${instead}.`);
  const { sign, whole = '0', over, under, number = '' } = groups;
  if (/^[1-9]\d{0,2},\d{3}$/.test(number))
    return refuse(
      `"${number}" can be read in two ways. Write ${number.replace(',', '')} or ${number.replace(',', '.')}.`,
    );
  if (under !== undefined && Number(under) === 0) return refuse('A fraction cannot have zero below its line.');
  const size = under === undefined ? numberOf(number) : Number(whole) + Number(over) / Number(under);
  const signed = sign === '-' ? -size : size;
  const named = (groups['unit'] ?? '').trim();
  if (named === '') return { ok: true, value: { amount: signed, unit: null } };
  const found = readUnit(named, wanted);
  if (!found) return refuse(`"${named.slice(0, 20)}" is no unit that the book knows. Write, for example, ${instead}.`);
  return { ok: true, value: { amount: signed * found.times, unit: found.unit } };
}

function settle({ amount, unit }: Parsed, own: Unit): ReadTyped {
  const base = toBase(amount, unit ?? own);
  return base.ok
    ? { ok: true, value: { base: base.value, amount, unit: unit ?? own, named: unit !== null } }
    : refuse(base.message);
}

/**
 * Reads one measure: `0.35 mm`, `14 thou`, `.014"`, `1 3/8 in`, `0,35`, `−5 °C`. A bare number is in `unit`.
 * Refuses, in a sentence: no number, a comma that may mean either thing (`1,250`), a unit the book does not know, or
 * one that measures something else.
 */
export function readTyped(text: string, unit: Unit): ReadTyped {
  const parsed = parse(text, example(unit), quantityOf(unit));
  if (!parsed.ok) return parsed;
  const { unit: named } = parsed.value;
  if (named && quantityOf(named) !== quantityOf(unit))
    return refuse(`${named} measures ${quantityOf(named)}, and here goes ${quantityOf(unit)}, for example in ${unit}.`);
  return settle(parsed.value, unit);
}

/** Reads one measure of any kind; the text must name its unit. */
export function readAny(text: string): ReadTyped {
  const parsed = parse(text, '89 lbf·in');
  if (!parsed.ok) return parsed;
  const { unit } = parsed.value;
  return unit ? settle(parsed.value, unit) : refuse('Write the unit after the number, for example 89 lbf·in.');
}

/** Reads a number that stands alone: `0,5`, `1 3/8`, `12 345`. Refuses what `readTyped` refuses, and a unit. */
export function readBare(text: string): { ok: true; value: number } | { ok: false; message: string } {
  const parsed = parse(text, '12');
  if (!parsed.ok) return parsed;
  const { amount, unit } = parsed.value;
  return unit ? refuse('Write the number alone, without a unit.') : { ok: true, value: amount };
}

const example = (unit: Unit): string => (unit === 'mm' ? '0.35 mm or 14 thou' : withUnit('12', unit));

/** Whether a measure needs the density of the fluid to become one in `unit`: lb/h against cc/min. */
export const needsDensity = (typed: Typed, unit: Unit): boolean => !sameKind(typed.unit, unit);
