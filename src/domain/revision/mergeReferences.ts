import { bindingsIn } from '../procedure/bindings';
import { COMPONENTS } from '../procedure/components';
import type { Procedure } from '../procedure/types';
import { type Found, replaceComponents } from './components';
import type { ListName } from './fields';

const LISTS: Partial<Record<string, ListName>> = {
  Torque: 'torques',
  Limit: 'limits',
  Worksheet: 'limits',
  Part: 'parts',
  Figure: 'figures',
  Timer: 'timers',
};

const pathsOf = ({ name, given }: Found): string[] => {
  const list = name === 'Timer' && given['stage'] !== undefined ? 'supplies' : LISTS[name];
  if (!list) return [];
  if (name === 'Worksheet') return bindingsIn(given['of']).map(({ key }) => `${list}.${key}`);
  return [`${list}.${given['of'] ?? ''}`];
};

function componentsIn(text: string): Found[] {
  const all: Found[] = [];
  replaceComponents(text, (found) => {
    all.push(found, ...(found.inside ? componentsIn(found.inside) : []));
    return null;
  });
  return all;
}

/** Everything that points at something which is not there: its place, and the paths of the entries that it wants. */
export function dangling({ frontmatter: head, intro, steps }: Procedure): Map<string, string[]> {
  const out = new Map<string, string[]>();
  const bodies = [{ id: 'intro', body: intro }, ...steps.map(({ id, body }) => ({ id: `step ${id}`, body }))];
  for (const { id, body } of bodies)
    for (const found of componentsIn(body)) {
      const given = Object.fromEntries(Object.entries(found.given).map(([name, value]) => [name, value ?? '']));
      const faults = COMPONENTS[found.name]?.faults(given, head) ?? [];
      if (faults.length > 0) out.set(`${id} ${found.name} ${JSON.stringify(given)}`, pathsOf(found));
    }
  const there = (list: ListName, key: string) => (head[list] as readonly { key: string }[]).some((e) => e.key === key);
  for (const { id, cautions } of steps)
    for (const key of cautions) if (!there('cautions', key)) out.set(`step ${id} caution ${key}`, [`cautions.${key}`]);
  for (const list of ['torques', 'limits'] as const)
    for (const { key, source } of head[list])
      if (source && !there('sources', source)) out.set(`${list} ${key} source ${source}`, [`sources.${source}`]);
  return out;
}

/**
 * Paths of the entries that a merged text points at and has no longer, or no longer in that form, where neither side
 * alone was at fault: one side took the entry away, the other put it to use.
 */
export function newlyDangling(merged: Procedure, mine: Procedure, theirs: Procedure): string[] {
  const before = [dangling(mine), dangling(theirs)];
  return [...dangling(merged)].flatMap(([fault, paths]) => (before.some((known) => known.has(fault)) ? [] : paths));
}
