import { ENTRY_FIELDS, HEAD_FIELDS, isListName, type ListName } from '../procedure/fields';
import type { Procedure } from '../procedure/types';
import { fieldsOf, nameOf } from '../revision/fields';

/** What something that was written about a text is tied to. Steps are found by id and entries by key, so it follows them. */
export type Anchor =
  | { to: 'whole' }
  | { to: 'step'; id: string }
  | { to: 'head'; field: string }
  /** `field` is null for the entry as a whole, and may name one of several: `passes.0`. */
  | { to: 'value'; list: ListName; key: string; field: string | null };

/** Reads `step:<id>`, `torques.cover-bolt.nm`, `minutes` or null for the whole. Undefined where it is none of them. */
export function readAnchor(text: string | null): Anchor | undefined {
  if (text === null) return { to: 'whole' };
  if (text.startsWith('step:')) return text.length > 5 ? { to: 'step', id: text.slice(5) } : undefined;
  const [list = '', key, ...rest] = text.split('.');
  // `order of the torques` is a change of its own, told by the name of the list.
  if (key === undefined) return Object.hasOwn(HEAD_FIELDS, list) ? { to: 'head', field: list } : undefined;
  if (!isListName(list) || !Object.hasOwn(ENTRY_FIELDS, list)) return undefined;
  if (!key) return undefined;
  const field = rest.length > 0 ? rest.join('.') : null;
  return field !== null && !Object.hasOwn(ENTRY_FIELDS[list], rest[0] ?? '')
    ? undefined
    : { to: 'value', list, key, field };
}

/** The entry that an anchor points at, as the text has it now. */
export const entryAt = (procedure: Procedure, { list, key }: { list: ListName; key: string }) =>
  procedure.frontmatter[list].find((entry) => entry.key === key);

/**
 * What an anchor is called in a text: "step 4, Fit the cover", "Cover bolt: tolerance", "the whole proposal". Null where
 * the text has no such step or value.
 */
export function placeOf(procedure: Procedure, text: string | null): string | null {
  const anchor = readAnchor(text);
  if (!anchor) return null;
  if (anchor.to === 'whole') return 'the whole proposal';
  if (anchor.to === 'head') return HEAD_FIELDS[anchor.field as keyof typeof HEAD_FIELDS];
  if (anchor.to === 'step') {
    const index = procedure.steps.findIndex(({ id }) => id === anchor.id);
    return index < 0 ? null : `step ${index + 1}, ${procedure.steps[index]?.title ?? ''}`;
  }
  const { list, field } = anchor;
  const entry = entryAt(procedure, anchor);
  if (!entry) return null;
  const name = nameOf(list, entry);
  if (field === null) return name;
  const named = fieldsOf(list, entry).find(({ path }) => path === field)?.words;
  const words = named ?? (ENTRY_FIELDS[list] as Record<string, string>)[field.split('.')[0] ?? ''] ?? '';
  return words ? `${name}: ${words}` : name;
}
