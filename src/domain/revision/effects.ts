import type { Frontmatter } from '../procedure/schema';
import { durationText } from '../procedure/values';
import { cautionEffect } from './cautionEffects';
import { effect, type Effect } from './effect';
import type { ListName } from './fields';
import { limitEffect } from './limitEffects';
import { torqueEffect } from './torqueEffects';

type Of<L extends ListName> = Frontmatter[L][number];

const ACTION_WORDS: Record<Of<'parts'>['action'], Record<Of<'parts'>['action'], string>> = {
  replace: {
    replace: '',
    inspect: 'Only inspected, where a new one was fitted',
    reuse: 'Used again, where a new one was fitted',
  },
  inspect: { inspect: '', replace: 'A new one, where it was inspected', reuse: 'No longer inspected' },
  reuse: { reuse: '', replace: 'A new one, where it was used again', inspect: 'Inspected before it is used again' },
};

function partEffect(field: string, from: Of<'parts'>, to: Of<'parts'>): Effect | null {
  if (field !== 'action' || from.action === to.action) return null;
  const words = ACTION_WORDS[from.action][to.action];
  return from.action === 'replace' && to.action === 'reuse'
    ? effect('part-reused', words, `the part “${to.name}” is used again, not replaced`)
    : effect('part-treated-otherwise', words);
}

/** What a time less or more means; `less` and `more` say for what. Minutes. */
function timeEffect(from: number | undefined, to: number | undefined, less: string, more: string): Effect | null {
  if (from === undefined || from === to) return null;
  if (to === undefined) return effect('time-shorter', 'No time is given any longer');
  const by = durationText(Math.abs(to - from));
  return to < from
    ? effect('time-shorter', `Shorter: ${by} less ${less}`)
    : effect('time-longer', `Longer: ${by} more ${more}`);
}

const supplyEffect = (field: string, from: Of<'supplies'>, to: Of<'supplies'>) =>
  field === 'cure'
    ? timeEffect(from.cure, to.cure, 'before it is put to use', 'before it is put to use')
    : field === 'skinOver'
      ? timeEffect(from.skinOver, to.skinOver, 'to close the joint', 'to close the joint')
      : null;

const timerEffect = (field: string, from: Of<'timers'>, to: Of<'timers'>) =>
  field === 'minutes' ? timeEffect(from.minutes, to.minutes, 'to wait', 'to wait') : null;

type FieldEffect<L extends ListName> = (field: string, from: Of<L>, to: Of<L>) => Effect | null;
const FIELDS: { [L in ListName]?: FieldEffect<L> } = {
  torques: torqueEffect,
  limits: limitEffect,
  cautions: cautionEffect,
  parts: partEffect,
  timers: timerEffect,
  supplies: supplyEffect,
};

/** What a changed field of an entry does: `nm`, `passes.1`, `max`. Null where nothing can be said beyond the change itself. */
export function fieldEffect<L extends ListName>(list: L, field: string, from: Of<L>, to: Of<L>): Effect | null {
  const of = FIELDS[list] as FieldEffect<L> | undefined;
  return of?.(field, from, to) ?? null;
}

/** What it does that an entry is gone altogether. One that comes is told by its own words. */
export function removalEffect(list: ListName, entry: Of<ListName>): Effect | null {
  switch (list) {
    case 'cautions': {
      const { hazard } = entry as Of<'cautions'>;
      return effect('caution-removed', 'Nobody is warned of it any longer', `the caution “${hazard}” is removed`);
    }
    case 'limits':
      return effect(
        'limit-wider',
        'Wider: any reading will do',
        `the limit “${(entry as Of<'limits'>).name}” is removed`,
      );
    case 'torques':
      return effect('fastener-changed', 'No torque is given for it any longer');
    case 'parts':
      return effect('part-treated-otherwise', 'The sheet no longer asks for it');
    case 'timers':
      return effect('time-shorter', 'No longer waited for');
    default:
      return null;
  }
}
