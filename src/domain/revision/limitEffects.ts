import { convert, isUnit, type Unit } from '../measure/convert';
import { formatNumber, withUnit } from '../measure/format';
import type { Limit } from '../procedure/schema';
import { effect, type Effect } from './effect';

/** The two ends of a limit in one unit; an end that is not given lets everything through. */
interface Ends {
  min: number;
  max: number;
}

const unitOf = ({ unit }: Limit): Unit | null => (unit !== undefined && isUnit(unit) ? unit : null);

function inUnit(value: number | undefined, from: Unit, to: Unit): number | undefined {
  if (value === undefined || from === to) return value;
  const converted = convert(value, from, to);
  return converted.ok ? converted.value : undefined;
}

/** Null where the limits measure different things, so that their numbers cannot be set against each other. */
function endsOf(from: Limit, to: Limit): { before: Ends; now: Ends; nominal: number; unit: Unit } | null {
  const [old, unit] = [unitOf(from), unitOf(to)];
  if (!old || !unit || from.quantity !== to.quantity) return null;
  const like = (value: number | undefined) => inUnit(value, old, unit);
  const [min, max] = [like(from.min), like(from.max)];
  if ((min === undefined) !== (from.min === undefined) || (max === undefined) !== (from.max === undefined)) return null;
  return {
    before: { min: min ?? -Infinity, max: max ?? Infinity },
    now: { min: to.min ?? -Infinity, max: to.max ?? Infinity },
    nominal: (to.nominal ?? NaN) - (like(from.nominal) ?? NaN),
    unit,
  };
}

/** Two figures that were written in different units and differ by less than this share were only rounded. */
const ROUNDED = 0.005;
const isSame = (from: Limit, to: Limit, a: number, b: number) =>
  a === b || (from.unit !== to.unit && Math.abs(a - b) <= ROUNDED * Math.max(Math.abs(a), Math.abs(b)));

/** "0.02 mm"; what binary fractions add to a difference is cut off. */
const amount = (value: number, unit: Unit) => withUnit(formatNumber(Number(Math.abs(value).toPrecision(3))), unit);

function endEffect(end: 'min' | 'max', from: Limit, to: Limit): Effect | null {
  const ends = endsOf(from, to);
  if (!ends) return effect('limit-moved', 'Judged by another kind of measure', `the limit “${to.name}” is another one`);
  const { before, now, unit } = ends;
  if (isSame(from, to, before[end], now[end])) return effect('limit-restated', 'The same in another unit');
  const out = (of: 'min' | 'max') =>
    isSame(from, to, before[of], now[of]) ? 0 : of === 'max' ? now.max - before.max : before.min - now.min;
  const here = out(end);
  const other = out(end === 'max' ? 'min' : 'max');
  if (here === 0 || Number.isNaN(here)) return effect('limit-restated', 'The same in another unit');
  const moved = here * other < 0;
  const head = moved ? 'Moved' : here > 0 ? 'Wider' : 'Narrower';
  const kind = moved ? 'limit-moved' : here > 0 ? 'limit-wider' : 'limit-narrower';
  const more = here > 0 === (end === 'max') ? 'more' : 'less';
  const does = Number.isFinite(here)
    ? `${end === 'max' ? 'allows' : 'asks for'} ${amount(here, unit)} ${more}`
    : here > 0
      ? `no ${end === 'max' ? 'most' : 'least'} is given any longer`
      : `there is a ${end === 'max' ? 'most' : 'least'} now`;
  // What was out of limits is let through, also where the other end takes something in for it.
  const grave =
    here > 0 ? `the limit “${to.name}” ${moved ? 'moves and lets through what was out' : 'is wider'}` : null;
  return effect(kind, `${head}: ${does}`, grave);
}

/** What a changed field of a limit does. An end that lets through what was out of limits is grave. */
export function limitEffect(field: string, from: Limit, to: Limit): Effect | null {
  switch (field) {
    case 'min':
    case 'max':
      return endEffect(field, from, to);
    case 'nominal': {
      const ends = endsOf(from, to);
      if (!ends || !Number.isFinite(ends.nominal) || ends.nominal === 0) return null;
      return effect('limit-moved', `Aims ${amount(ends.nominal, ends.unit)} ${ends.nominal > 0 ? 'higher' : 'lower'}`);
    }
    case 'resolution': {
      const [old, unit] = [unitOf(from), unitOf(to)];
      const before = old && unit ? inUnit(from.resolution, old, unit) : undefined;
      if (before === undefined || to.resolution === undefined || isSame(from, to, before, to.resolution)) return null;
      return effect('limit-moved', to.resolution > before ? 'Read more coarsely' : 'Read more finely');
    }
    case 'condition':
      return effect('limit-moved', 'Measured in another state');
    case 'expect':
      return effect('limit-moved', 'Another finding passes');
    default:
      return null;
  }
}
