import { ENTRY_FIELDS } from '../procedure/fields';
import { KEYED_LISTS, Limit, Torque, type Frontmatter } from '../procedure/schema';
import type { Procedure } from '../procedure/types';
import { boxesOf, fieldKind, type Draft, type Entry, type FieldKind, type ListName } from './draft';
import { readNumber, readNumbers } from './numbers';

const READ: Record<FieldKind, (text: string) => unknown> = {
  text: (text) => text.trim().replace(/\s*\n\s*/g, ' '),
  number: readNumber,
  numbers: (text) =>
    boxesOf(text)
      .filter((box) => box.trim())
      .map(readNumber),
  places: (text) =>
    text
      .split('\n')
      .filter((line) => line.trim())
      .map(readNumbers),
  order: readNumbers,
};

function valueOf(text: string | undefined, kind: FieldKind): unknown {
  if (!text?.trim()) return undefined;
  return READ[kind](text);
}

const entryOf = (list: ListName, entry: Entry) =>
  Object.fromEntries(
    Object.keys(ENTRY_FIELDS[list])
      .map((field) => [field, valueOf(entry[field], fieldKind(list, field))])
      .filter(([, value]) => value !== undefined),
  );

/** The torque that a row of the form stands for; null while it is not a whole one. */
export function torqueOf(entry: Entry): Torque | null {
  const read = Torque.safeParse(entryOf('torques', entry));
  return read.success ? read.data : null;
}

/** The same for a limit. */
export function limitOf(entry: Entry): Limit | null {
  const read = Limit.safeParse(entryOf('limits', entry));
  return read.success ? read.data : null;
}

/**
 * The procedure that a draft stands for. It has the shape of one, not yet its validity: a number that could not
 * be read is still its text, and what is empty is left out. The check tells what is wrong.
 */
export function procedureOf(draft: Draft): Procedure {
  const lists = Object.fromEntries(KEYED_LISTS.map((list) => [list, draft[list].map((entry) => entryOf(list, entry))]));
  const frontmatter = {
    title: valueOf(draft.title, 'text'),
    summary: valueOf(draft.summary, 'text'),
    system: valueOf(draft.system, 'text'),
    engines: draft.engines,
    minutes: valueOf(draft.minutes, 'number'),
    skill: valueOf(draft.skill, 'text'),
    critical: draft.critical,
    ...lists,
  } as unknown as Frontmatter;
  return {
    frontmatter,
    intro: draft.intro,
    steps: draft.steps.map(({ id, title, cautions, body }) => ({ id, title: title.trim(), cautions, body })),
  };
}
