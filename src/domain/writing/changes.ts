import { ENTRY_FIELDS, ENTRY_WORDS, HEAD_FIELDS } from '../procedure/fields';
import { KEYED_LISTS } from '../procedure/schema';
import type { Step } from '../procedure/types';
import { lowered } from '../wording';
import { entryName, type Draft, type Entry, type ListName } from './draft';
import { isProvisional } from './ids';

/** One thing that differs between two drafts. */
export interface DraftChange {
  /** By key and id, so that it follows what moves: `title`, `torques.cover-bolt.nm`, `steps.draw-down.body`. */
  path: string;
  /** `typed`: text in one field. `made`: added, deleted, moved or switched. `named`: a new step got the id it keeps. */
  kind: 'typed' | 'made' | 'named';
  /** "step 3 deleted", "torque Cover bolt changed" */
  words: string;
}

const HEAD = ['title', 'summary', 'system', 'minutes', 'skill'] as const;
const LONGEST_NAME = 48;

const oneOf = (list: ListName) => (list === 'figures' ? 'drawing' : lowered(ENTRY_WORDS[list]));
const short = (name: string) => (name.length > LONGEST_NAME ? `${name.slice(0, LONGEST_NAME - 1).trimEnd()}…` : name);
const same = (a: readonly unknown[], b: readonly unknown[]) =>
  a.length === b.length && a.every((one, i) => one === b[i]);

const typed = (path: string, words: string): DraftChange => ({ path, kind: 'typed', words: `${words} changed` });

function headChanges(from: Draft, to: Draft): DraftChange[] {
  return [
    ...HEAD.filter((field) => from[field] !== to[field]).map((field) => typed(field, HEAD_FIELDS[field])),
    ...(same(from.engines, to.engines) ? [] : [{ path: 'engines', kind: 'made', words: 'engines changed' } as const]),
    ...(from.critical === to.critical
      ? []
      : [
          {
            path: 'critical',
            kind: 'made',
            words: to.critical ? 'marked critical' : 'no longer marked critical',
          } as const,
        ]),
    ...(from.intro === to.intro ? [] : [typed('intro', 'introduction')]),
  ];
}

/** Entries by their keys. A key that stands twice, as it may while a draft is faulty, is told apart by its place. */
function byKey<T>(entries: readonly T[], keyOf: (entry: T) => string): Map<string, T> {
  const found = new Map<string, T>();
  for (const entry of entries) {
    let key = keyOf(entry);
    while (found.has(key)) key += "'";
    found.set(key, entry);
  }
  return found;
}

/** The places, from 1, of the one key that moved; null where several did. */
function oneMoved(from: readonly string[], to: readonly string[]): { from: number; to: number } | null {
  const at = from.findIndex((key, i) => key !== to[i]);
  for (const moved of [from[at] ?? '', to[at] ?? ''])
    if (
      same(
        from.filter((key) => key !== moved),
        to.filter((key) => key !== moved),
      )
    )
      return { from: from.indexOf(moved) + 1, to: to.indexOf(moved) + 1 };
  return null;
}

/** The keys that both have, in the order of each. */
function shared(from: readonly string[], to: readonly string[]): [string[], string[]] {
  const [a, b] = [new Set(from), new Set(to)];
  return [from.filter((key) => b.has(key)), to.filter((key) => a.has(key))];
}

function listChanges(list: ListName, from: readonly Entry[], to: readonly Entry[]): DraftChange[] {
  const [before, after] = [byKey(from, (e) => e['key'] ?? ''), byKey(to, (e) => e['key'] ?? '')];
  const called = (entry: Entry) => `${oneOf(list)} ${short(entryName(list, entry))}`.trim();
  const made = (key: string, entry: Entry, what: string): DraftChange => ({
    path: `${list}.${key}`,
    kind: 'made',
    words: `${called(entry)} ${what}`,
  });
  const changes: DraftChange[] = [];
  for (const [key, entry] of before) if (!after.has(key)) changes.push(made(key, entry, 'deleted'));
  for (const [key, entry] of after) {
    const old = before.get(key);
    if (!old) changes.push(made(key, entry, 'added'));
    else
      for (const field of Object.keys(ENTRY_FIELDS[list]))
        if ((old[field] ?? '') !== (entry[field] ?? ''))
          changes.push({ path: `${list}.${key}.${field}`, kind: 'typed', words: `${called(entry)} changed` });
  }
  const [was, is] = shared([...before.keys()], [...after.keys()]);
  if (!same(was, is)) changes.push({ path: list, kind: 'made', words: `${list} put in another order` });
  return changes;
}

/** Steps whose first title gave them another id are the same steps still. */
function renamed(from: readonly Step[], to: readonly Step[]): Map<string, string> {
  const [before, after] = [new Set(from.map(({ id }) => id)), new Set(to.map(({ id }) => id))];
  return new Map(
    from.flatMap(({ id }, i) => {
      const now = to[i]?.id;
      return isProvisional(id) && !after.has(id) && now !== undefined && !before.has(now) ? [[id, now]] : [];
    }),
  );
}

function stepChanges(from: readonly Step[], to: readonly Step[]): DraftChange[] {
  const names = renamed(from, to);
  const before = byKey(from, ({ id }) => names.get(id) ?? id);
  const after = byKey(to, ({ id }) => id);
  const [was, is] = [[...before.keys()], [...after.keys()]];
  const changes: DraftChange[] = [];
  was.forEach((id, i) => {
    if (!after.has(id)) changes.push({ path: `steps.${id}`, kind: 'made', words: `step ${i + 1} deleted` });
  });
  is.forEach((id, i) => {
    const [old, now] = [before.get(id), after.get(id)];
    const put = (field: string, kind: DraftChange['kind'], words = `step ${i + 1} changed`) =>
      changes.push({ path: `steps.${id}${field}`, kind, words });
    if (!now) return;
    if (!old) return void put('', 'made', `step ${i + 1} added`);
    if (old.title !== now.title) put('.title', 'typed');
    if (old.body !== now.body) put('.body', 'typed');
    if (!same(old.cautions, now.cautions)) put('.cautions', 'made', `cautions before step ${i + 1} changed`);
    if (old.id !== now.id) put('.id', 'named');
  });
  const [a, b] = shared(was, is);
  if (!same(a, b)) {
    const moved = oneMoved(a, b);
    const id = moved && a[moved.from - 1];
    const words = id ? `step ${was.indexOf(id) + 1} moved to ${is.indexOf(id) + 1}` : 'steps put in another order';
    changes.push({ path: id ? `steps.${id}` : 'steps', kind: 'made', words });
  }
  return changes;
}

/**
 * What differs between two drafts, field by field, in the order of the sheet, the reason last. Reads no Markdown and no numbers, so it also
 * works on drafts that are faulty, and is cheap enough for every key that is pressed.
 */
export const draftChanges = (from: Draft, to: Draft): DraftChange[] => [
  ...headChanges(from, to),
  ...stepChanges(from.steps, to.steps),
  ...KEYED_LISTS.flatMap((list) => (from[list] === to[list] ? [] : listChanges(list, from[list], to[list]))),
  ...(from.reason === to.reason ? [] : [typed('reason', 'reason')]),
];

/** Each thing once: "step 3 changed" for its title and its words. */
export const changeWords = (changes: readonly DraftChange[]): string[] => [
  ...new Set(changes.map(({ words }) => words)),
];

/** Several changes as one: "step 3 deleted and 2 more". Empty for none. */
export function inOne(changes: readonly DraftChange[]): string {
  const [first, ...more] = changeWords(changes);
  return first === undefined ? '' : more.length === 0 ? first : `${first} and ${more.length} more`;
}
