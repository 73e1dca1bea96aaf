import { KEYED_LISTS } from '../procedure/schema';
import type { Procedure } from '../procedure/types';
import { fieldsOf } from './fields';

/**
 * Since which revision each part of a text reads as it does: the last revision at which that part changed. A step is
 * followed by its id, whatever place it moves to; a value by its list, key and field. A part that was taken out and came
 * back reads so since it came back, also where it says the same as before.
 */

/** The parts of a text by place: `step:<id>:title`, `torques.cover-bolt.nm`, `title`, `intro`. Each with what it says. */
export function partsOf({ frontmatter, intro, steps }: Procedure): Map<string, string> {
  const parts = new Map<string, string>();
  for (const { id, title, cautions, body } of steps) {
    parts.set(`step:${id}:title`, title);
    parts.set(`step:${id}:body`, body);
    parts.set(`step:${id}:cautions`, cautions.join(' '));
  }
  if (intro !== '') parts.set('intro', intro);
  for (const list of KEYED_LISTS)
    for (const entry of frontmatter[list]) {
      // An entry stands there also where all that it says is its key.
      parts.set(`${list}.${entry.key}`, '');
      for (const { path, raw } of fieldsOf(list, entry)) parts.set(`${list}.${entry.key}.${path}`, raw);
    }
  const head = Object.fromEntries(
    Object.entries(frontmatter).filter(([name]) => !(KEYED_LISTS as readonly string[]).includes(name)),
  );
  for (const { path, raw } of fieldsOf('head', head)) parts.set(path, raw);
  return parts;
}

/** The letter of the origin of each part of a text, by place. */
export type Origins = Record<string, string>;

/**
 * The origins of a text from those of the one before it: one comparison, however long the chain is.
 *
 * @param before the text before and its origins; null for the first revision, all of which is its own
 * @param letter of `text`
 */
export function originsAfter(
  before: { text: Procedure; origins: Origins } | null,
  text: Procedure,
  letter: string,
): Origins {
  const old = before ? partsOf(before.text) : new Map<string, string>();
  const origins: Origins = Object.create(null) as Origins;
  for (const [place, said] of partsOf(text))
    origins[place] = (before && old.get(place) === said ? before.origins[place] : undefined) ?? letter;
  return origins;
}
