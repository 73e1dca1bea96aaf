import { ENTRY_FIELDS, HEAD_FIELDS, isListName } from '../procedure/fields';
import { type Frontmatter, KEYED_LISTS } from '../procedure/schema';
import type { Entry, ListName } from './fields';
import { mergeOrder } from './mergeOrder';
import { pick, same } from './mergeSame';
import { type Asking, type Conflict, settle, type Side, type Texts } from './mergeTypes';
import { entryLabel, entryText, fieldLabel, fieldText } from './mergeWords';

type Three<T> = Record<Side, T>;
type Fields = Record<string, unknown>;

/**
 * A torque with one side's number and the other's condition is a number that nobody chose, and so is a limit or a
 * caution pieced together. They are taken whole from one side, where lines of text would merge without a word.
 */
const WHOLE: ReadonlySet<ListName> = new Set(['torques', 'limits', 'cautions']);

const three = <T, U>(of: Three<T>, make: (value: T) => U): Three<U> => ({
  base: make(of.base),
  mine: make(of.mine),
  theirs: make(of.theirs),
});

/** One field of the head or of an entry; undefined where it is not set. */
function mergeField(
  asking: Asking,
  list: ListName | 'head',
  name: string,
  of: Three<object | undefined>,
  path: string,
) {
  const values = three(of, (owner) => (owner as Fields | undefined)?.[name]);
  const clean = pick(values.base, values.mine, values.theirs);
  if (clean) return clean.value;
  const says = three(of, (owner) => fieldText(list, name, owner));
  const label = fieldLabel(list, name, of.mine ?? of.theirs ?? {});
  return settle<unknown>(asking, { path, kind: 'field', reason: 'both', label, ...values, says });
}

function mergeFields(list: ListName, of: Three<Entry>, asking: Asking): Entry {
  const out: Fields = {};
  for (const name of Object.keys(ENTRY_FIELDS[list])) {
    const value = mergeField(asking, list, name, of, `${list}.${of.base.key}.${name}`);
    if (value !== undefined && value !== null) out[name] = value;
  }
  return out as unknown as Entry;
}

const reasonFor = ({ base, mine, theirs }: Three<Entry | undefined>): Conflict['reason'] =>
  !mine ? 'mineRemoved' : !theirs ? 'theirsRemoved' : base ? 'both' : 'added';

/** Whether one side holds all that the other changed, so that it was chosen whole by somebody. */
function wholeOf(list: ListName, of: Three<Entry>): Entry | null {
  const quiet: Asking = { choices: {}, conflicts: [] };
  const merged = mergeFields(list, of, quiet);
  if (quiet.conflicts.length > 0) return null;
  return same(merged, of.mine) ? of.mine : same(merged, of.theirs) ? of.theirs : null;
}

function mergeEntry(asking: Asking, list: ListName, key: string, of: Three<Entry | undefined>, asked: boolean) {
  const path = `${list}.${key}`;
  const clean = pick(of.base, of.mine, of.theirs);
  const wanted = asked && !same(of.mine, of.theirs);
  if (clean && !wanted) return clean.value;
  const { base, mine, theirs } = of;
  if (base && mine && theirs && !wanted) {
    if (!WHOLE.has(list)) return mergeFields(list, { base, mine, theirs }, asking);
    const chosen = wholeOf(list, { base, mine, theirs });
    if (chosen) return chosen;
  }
  const some = mine ?? theirs ?? base;
  const conflict: Conflict = {
    path,
    kind: 'entry',
    reason: clean ? 'reference' : reasonFor(of),
    label: some ? entryLabel(list, some) : key,
    ...three(of, (entry) => entry ?? null),
    says: three(of, (entry) => entryText(list, entry)),
  };
  return settle<Entry | null>(asking, conflict) ?? undefined;
}

function orderOf(
  asking: Asking,
  list: ListName | 'engines',
  keys: Three<string[]>,
  members: Set<string>,
  names: (key: string) => string,
) {
  const merged = mergeOrder(keys, members, false);
  if ('order' in merged) return merged.order;
  const says = three(merged.sides, (order) => order.map(names).join('; '));
  const conflict = { path: `order.${list}`, kind: 'order', reason: 'order', label: `Order of the ${list}` } as const;
  return settle<string[]>(asking, { ...conflict, ...merged.sides, says });
}

function mergeList(asking: Asking, list: ListName, { base, mine, theirs }: Texts, asked: ReadonlySet<string>): Entry[] {
  const lists: Three<readonly Entry[]> = three({ base, mine, theirs }, (text) => text.frontmatter[list]);
  const keys = three(lists, (entries) => entries.map(({ key }) => key));
  const kept = new Map<string, Entry>();
  for (const key of new Set([...keys.base, ...keys.theirs, ...keys.mine].sort())) {
    const of = three(lists, (entries) => entries.find((entry) => entry.key === key));
    const entry = mergeEntry(asking, list, key, of, asked.has(`${list}.${key}`));
    if (entry) kept.set(key, entry);
  }
  const names = (key: string) => {
    const entry = kept.get(key);
    return entry ? entryLabel(list, entry) : key;
  };
  return orderOf(asking, list, keys, new Set(kept.keys()), names).flatMap((key) => kept.get(key) ?? []);
}

/** Engines are a set in an order: what either side adds is in, what either takes away is out. */
function mergeEngines(asking: Asking, { base, mine, theirs }: Texts): string[] {
  const keys = three({ base, mine, theirs }, (text) => text.frontmatter.engines);
  const all = [...new Set([...keys.base, ...keys.mine, ...keys.theirs])];
  const stays = (key: string) =>
    pick(...([keys.base, keys.mine, keys.theirs].map((k) => k.includes(key)) as [boolean, boolean, boolean]))?.value;
  return orderOf(asking, 'engines', keys, new Set(all.filter(stays)), (key) => key);
}

/** @param asked paths of entries to ask about though lines of text would merge: the words of the other side point at them */
export function mergeFrontmatter(asking: Asking, texts: Texts, asked: ReadonlySet<string>): Frontmatter {
  const heads = three<Texts['base'], Frontmatter>(texts, (text) => text.frontmatter);
  const out: Fields = {};
  for (const name of Object.keys(HEAD_FIELDS)) {
    if (name === 'engines') out[name] = mergeEngines(asking, texts);
    else if (!isListName(name)) out[name] = mergeField(asking, 'head', name, heads, name);
  }
  for (const list of KEYED_LISTS) out[list] = mergeList(asking, list, texts, asked);
  return out as unknown as Frontmatter;
}
