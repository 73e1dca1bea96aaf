import { type Frontmatter, KEYED_LISTS } from '../procedure/schema';
import { entryReason, type Reason } from './critical';
import type { Effect } from './effect';
import { fieldEffect, removalEffect } from './effects';
import { detailOf, type Entry, fieldsOf, type ListName, nameOf, percentChange, wholeOf } from './fields';
import type { ValueChange } from './types';

export interface ValueDifference {
  change: ValueChange;
  reason: Reason | null;
  effect: Effect | null;
}

const detail = <L extends ListName>(list: L, entry: Frontmatter[L][number]) =>
  (detailOf[list] as (entry: Frontmatter[L][number]) => string | null)(entry);

function wholeEntry(list: ListName, entry: Entry, kind: 'added' | 'removed'): ValueDifference {
  const text = (wholeOf[list] as (entry: Entry) => string)(entry);
  const reason = kind === 'removed' ? entryReason(list, entry, null) : null;
  const does = kind === 'removed' ? removalEffect(list, entry) : null;
  return {
    reason,
    effect: does,
    change: {
      path: `${list}.${entry.key}`,
      list,
      key: entry.key,
      kind,
      label: nameOf(list, entry),
      detail: detail(list, entry),
      from: kind === 'removed' ? text : null,
      to: kind === 'added' ? text : null,
      percent: null,
      effect: does?.words ?? null,
      critical: reason?.words ?? null,
    },
  };
}

/** What fields belong to: an entry of a list, or the head of the sheet. */
interface Owner {
  list: ListName | 'head';
  key: string | null;
  name: string;
  detail: string | null;
  reason: (field: string) => Reason | null;
  /** What a changed field does; its path may name a place in a list, `passes.1`. */
  effect: (path: string) => Effect | null;
}

const HEAD: Owner = { list: 'head', key: null, name: '', detail: null, reason: () => null, effect: () => null };

const ownerOf = (list: ListName, before: Entry, entry: Entry): Owner => ({
  list,
  key: entry.key,
  name: nameOf(list, entry),
  detail: detail(list, entry),
  reason: (field) => entryReason(list, entry, field),
  effect: (path) => fieldEffect(list, path, before, entry),
});

function fieldChanges({ list, key, name, ...owner }: Owner, from: object, to: object): ValueDifference[] {
  const before = new Map(fieldsOf(list, from).map((field) => [field.path, field]));
  const after = new Map(fieldsOf(list, to).map((field) => [field.path, field]));
  // Fields in the order of the new text, then those that it has lost.
  const paths = [...new Set([...after.keys(), ...before.keys()])];
  return paths.flatMap((path): ValueDifference[] => {
    const old = before.get(path);
    const now = after.get(path);
    if (old?.raw === now?.raw) return [];
    const reason = owner.reason(path.split('.')[0] ?? path);
    const does = owner.effect(path);
    const change: ValueChange = {
      path: key === null ? path : `${list}.${key}.${path}`,
      list,
      key,
      kind: !old ? 'added' : !now ? 'removed' : 'changed',
      label: [name, (now ?? old)?.words].filter(Boolean).join(': '),
      detail: owner.detail,
      from: old?.text ?? null,
      to: now?.text ?? null,
      percent: percentChange(old, now),
      effect: does?.words ?? null,
      critical: reason?.words ?? null,
    };
    return [{ change, reason, effect: does }];
  });
}

/** The order in which a list is laid out, where entries that both texts have changed places. */
function orderChange(list: ListName, from: readonly Entry[], to: readonly Entry[]): ValueDifference[] {
  const shared = (entries: readonly Entry[], others: readonly Entry[]) =>
    entries.filter(({ key }) => others.some((other) => other.key === key));
  const before = shared(from, to);
  const after = shared(to, from);
  if (before.every((entry, i) => entry.key === after[i]?.key)) return [];
  const names = (entries: readonly Entry[]) => entries.map((entry) => nameOf(list, entry)).join('; ');
  return [
    {
      reason: null,
      effect: null,
      change: {
        path: list,
        list,
        key: null,
        kind: 'changed',
        label: `Order of the ${list}`,
        detail: null,
        from: names(before),
        to: names(after),
        percent: null,
        effect: null,
        critical: null,
      },
    },
  ];
}

function listChanges(list: ListName, from: readonly Entry[], to: readonly Entry[]): ValueDifference[] {
  const old = new Map(from.map((entry) => [entry.key, entry]));
  const now = new Map(to.map((entry) => [entry.key, entry]));
  return [
    ...to.flatMap((entry) => {
      const before = old.get(entry.key);
      return before ? fieldChanges(ownerOf(list, before, entry), before, entry) : [wholeEntry(list, entry, 'added')];
    }),
    ...from.filter(({ key }) => !now.has(key)).map((entry) => wholeEntry(list, entry, 'removed')),
    ...orderChange(list, from, to),
  ];
}

/** The lists in the order in which they matter at the bench. */
const BENCH_ORDER = [
  'torques',
  'limits',
  'cautions',
  'parts',
  'timers',
  'supplies',
  'tools',
  'figures',
  'sources',
] as const satisfies readonly ListName[];

const headOf = (frontmatter: Frontmatter) =>
  Object.fromEntries(
    Object.entries(frontmatter).filter(([name]) => !(KEYED_LISTS as readonly string[]).includes(name)),
  );

/** Every value that differs between two front matters, those that hands act on first. `null` is a blank sheet. */
export function compareValues(from: Frontmatter | null, to: Frontmatter): ValueDifference[] {
  return [
    ...BENCH_ORDER.flatMap((list) => listChanges(list, from?.[list] ?? [], to[list])),
    ...fieldChanges(HEAD, from ? headOf(from) : {}, headOf(to)),
  ];
}
