import { listed } from '../wording';
import { limitKeysIn } from '../procedure/bindings';
import { isListName } from '../procedure/fields';
import type { Draft, ListName } from './draft';

/** Components whose `of` names entries of a list; a timer's may also be a supply's. */
const COMPONENTS: Partial<Record<ListName, RegExp>> = {
  torques: /<Torque\b[^>]*\sof="([^"]*)"/g,
  limits: /<(?:Limit|Worksheet)\b[^>]*\sof="([^"]*)"/g,
  parts: /<Part\b[^>]*\sof="([^"]*)"/g,
  timers: /<Timer\b(?![^>]*\sstage=)[^>]*\sof="([^"]*)"/g,
  supplies: /<Timer\b(?=[^>]*\sstage=)[^>]*\sof="([^"]*)"/g,
  figures: /<Figure\b[^>]*\sof="([^"]*)"/g,
  cautions: /<Caution\b[^>]*\sof="([^"]*)"/g,
};

/** Keys of a list that a text points at (a worksheet's without their fields), each once, in reading order. */
export function keysIn(text: string, list: ListName): string[] {
  const pattern = COMPONENTS[list];
  if (!pattern) return [];
  return [...new Set([...text.matchAll(pattern)].flatMap(([, of]) => limitKeysIn(of)))];
}

/** Numbers, from 1, of the steps that use an entry. */
export const stepsUsing = (draft: Pick<Draft, 'steps'>, list: ListName, key: string): number[] =>
  draft.steps.flatMap((step, i) =>
    keysIn(step.body, list).includes(key) || (list === 'cautions' && step.cautions.includes(key)) ? [i + 1] : [],
  );

/** Where an entry is used, in words: "step 4", "steps 4 and 5", "the introduction", "2 torques"; empty where nowhere. */
export function usesInWords(draft: Draft, list: ListName, key: string): string {
  const steps = stepsUsing(draft, list, key);
  const where: string[] = [];
  if (keysIn(draft.intro, list).includes(key)) where.push('the introduction');
  if (steps.length) where.push(`${steps.length === 1 ? 'step' : 'steps'} ${listed(steps)}`);
  if (list === 'sources')
    for (const [name, one] of [
      ['torques', 'torque'],
      ['limits', 'limit'],
    ] as const) {
      const n = draft[name].filter((entry) => entry['source'] === key).length;
      if (n) where.push(`${n} ${one}${n === 1 ? '' : 's'}`);
    }
  return listed(where);
}

/** Where a problem's path leads in the form: a step by its index, a list by its name, or the head. */
export function placeOfPath(path: string): { step: number } | { list: ListName } | 'sheet' {
  const [first, second] = path.split('.');
  if (first === 'steps' && second !== undefined) return { step: Number(second) };
  return isListName(first) ? { list: first } : 'sheet';
}
