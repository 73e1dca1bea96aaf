import { placeOfPath } from '@/domain/writing/uses';
import type { Draft, ListName } from '@/domain/writing/draft';

/** What the middle of the desk shows: a step, a list of values, the sheet's own words, or what changes. */
export type Place = { step: string } | { list: ListName } | 'sheet' | 'changes';

/** Lists in the rail, in its order. Supplies stand under tools, as on the sheet. */
export const RAIL = [
  { title: 'Values', lists: ['torques', 'limits', 'timers'] },
  { title: 'Before you start', lists: ['parts', 'tools', 'supplies', 'cautions'] },
  { title: 'The sheet', lists: ['figures', 'sources'] },
] as const satisfies readonly { title: string; lists: readonly ListName[] }[];

export const LIST_NAMES: Record<ListName, string> = {
  torques: 'Torques',
  limits: 'Limits',
  timers: 'Timers',
  parts: 'Parts',
  tools: 'Tools',
  supplies: 'Supplies',
  cautions: 'Cautions',
  figures: 'Drawings',
  sources: 'Sources',
};

export const ONE_OF: Record<ListName, string> = {
  torques: 'torque',
  limits: 'limit',
  timers: 'timer',
  parts: 'part',
  tools: 'tool',
  supplies: 'supply',
  cautions: 'caution',
  figures: 'drawing',
  sources: 'source',
};

const isList = (name: string): name is ListName => Object.hasOwn(LIST_NAMES, name);

export function placeOfHash(hash: string, draft: Draft): Place {
  const name = decodeURIComponent(hash.replace(/^#/, ''));
  if (name === 'sheet' || name === 'changes') return name;
  if (isList(name)) return { list: name };
  const id = name.replace(/^step-/, '');
  const step = draft.steps.find((one) => one.id === id) ?? draft.steps[0];
  return step ? { step: step.id } : 'sheet';
}

export const hashOfPlace = (place: Place): string =>
  typeof place === 'string' ? `#${place}` : 'step' in place ? `#step-${place.step}` : `#${place.list}`;

export const samePlace = (a: Place, b: Place) => hashOfPlace(a) === hashOfPlace(b);

/** The place that shows the field at a problem's path. */
export function placeOfProblem(path: string, draft: Draft): Place {
  const place = placeOfPath(path);
  if (place === 'sheet' || 'list' in place) return place;
  const step = draft.steps[place.step];
  return step ? { step: step.id } : 'sheet';
}

/** The place that shows what a change of the history names by key and id; null where it is nowhere, or everywhere. */
export function placeOfChange(path: string, draft: Draft): Place | null {
  const [list = '', key] = path.split('.');
  if (isList(list)) return { list };
  if (list === 'steps') return key !== undefined && draft.steps.some(({ id }) => id === key) ? { step: key } : null;
  return list === 'reason' ? null : 'sheet';
}

/** Id of the control of a field, so that a problem can lead to it. */
export const fieldId = (path: string) => `f-${path.replace(/\./g, '-')}`;
