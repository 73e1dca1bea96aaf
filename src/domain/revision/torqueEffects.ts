import { formatNumber, withUnit } from '../measure/format';
import type { Torque } from '../procedure/schema';
import { effect, type Effect } from './effect';

const amount = (value: number, unit: 'N·m' | '°') =>
  withUnit(formatNumber(Number(Math.abs(value).toPrecision(4))), unit);

/** "8.8" and "SAE 5": how strong a class is among its own kind. Null where it is neither. */
function strength(strengthClass: string | undefined): { kind: string; value: number } | null {
  const [, kind = '', digits] = /^(\D*)(\d+(?:\.\d+)?)$/.exec(strengthClass ?? '') ?? [];
  return digits === undefined ? null : { kind: kind.trim(), value: Number(digits) };
}

function classEffect(from: Torque, to: Torque): Effect {
  const [old, now] = [strength(from.class), strength(to.class)];
  if (to.class === undefined) return effect('fastener-changed', 'How strong it must be is no longer told');
  if (!old || !now || old.kind !== now.kind || old.value === now.value)
    return effect('fastener-changed', from.class === undefined ? 'Its strength is told now' : 'Another strength');
  return effect('fastener-changed', now.value < old.value ? 'A weaker fastener' : 'A stronger fastener');
}

function toleranceEffect(from: number | undefined, to: number | undefined, unit: 'N·m' | '°'): Effect | null {
  if (from === to) return null;
  if (to === undefined) return effect('tolerance-looser', 'Looser: no tolerance is given any longer');
  if (from === undefined) return effect('tolerance-tighter', 'A tolerance stands now');
  return to > from
    ? effect('tolerance-looser', `Looser: ${amount(to - from, unit)} more either way`)
    : effect('tolerance-tighter', `Closer: ${amount(from - to, unit)} less either way`);
}

/** A pass or a turn of a torque, by its place. Those of the longer list that the shorter has not were dropped or added. */
function turnEffect(name: 'passes' | 'angles', i: number, from: Torque, to: Torque): Effect | null {
  const [old, now] = [from[name]?.[i], to[name]?.[i]];
  if (old === undefined && now === undefined) return null;
  if (now === undefined)
    return name === 'passes'
      ? effect('passes-dropped', 'One pass fewer')
      : effect('turns-changed', 'One turn fewer: it clamps less');
  if (old === undefined)
    return name === 'passes'
      ? effect('passes-added', 'One pass more')
      : effect('turns-changed', 'One turn more: it clamps harder');
  if (name === 'passes' || old === now) return null;
  return effect('turns-changed', `Turned ${amount(now - old, '°')} ${now > old ? 'further' : 'less far'}`);
}

/** What a changed field of a torque does. Its clamp load is weighed apart, since several fields decide it together. */
export function torqueEffect(field: string, from: Torque, to: Torque): Effect | null {
  const [name = '', place] = field.split('.');
  switch (name) {
    case 'nm':
      return to.nm > from.nm
        ? effect('torque-up', `Tighter: ${amount(to.nm - from.nm, 'N·m')} more`)
        : effect('torque-down', `Looser: ${amount(from.nm - to.nm, 'N·m')} less`);
    case 'tolerance':
      return toleranceEffect(from.tolerance, to.tolerance, 'N·m');
    case 'angleTolerance':
      return toleranceEffect(from.angleTolerance, to.angleTolerance, '°');
    case 'passes':
    case 'angles':
      return turnEffect(name, Number(place), from, to);
    case 'class':
      return classEffect(from, to);
    case 'condition':
      return effect(
        'fastener-changed',
        from.nm === to.nm ? 'The same torque clamps otherwise' : 'The thread rubs otherwise',
      );
    case 'thread':
    case 'pitch':
      return effect('fastener-changed', 'Another thread');
    case 'count': {
      const by = Math.abs(to.count - from.count);
      return effect('fastener-changed', `${by} ${to.count < from.count ? 'fewer' : 'more'} to tighten`);
    }
    case 'order':
      if (!to.order) return effect('order-changed', 'No order is given any longer');
      return effect('order-changed', from.order ? 'Tightened in another order' : 'An order is given now');
    default:
      return null;
  }
}
