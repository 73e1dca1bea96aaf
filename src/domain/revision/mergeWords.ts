import { capital } from '../wording';
import { ENTRY_FIELDS, HEAD_FIELDS } from '../procedure/fields';
import type { Step } from '../procedure/types';
import { type Entry, fieldsOf, type ListName, nameOf } from './fields';

/** What an author reads of the values that a merge asks about. Never throws: a draft may hold anything. */

const FIELDS: Record<ListName, Record<string, string>> = ENTRY_FIELDS;

/** One field as it reads: "10 N·m"; null where it is not set. */
export function fieldText(list: ListName | 'head', name: string, owner: object | undefined): string | null {
  const value = (owner as Record<string, unknown> | undefined)?.[name];
  if (owner === undefined || value === undefined) return list === 'head' && name === 'critical' ? 'no' : null;
  const shown = fieldsOf(list, owner).filter(({ path }) => path === name || path.startsWith(`${name}.`));
  if (shown.length > 0) return shown.map(({ text }) => text).join(', ');
  return name === 'critical' ? 'no' : null;
}

/** "Bench time", or "Cover gasket: quantity". */
export function fieldLabel(list: ListName | 'head', name: string, owner: object): string {
  const words = list === 'head' ? (HEAD_FIELDS as Record<string, string>)[name] : FIELDS[list][name];
  const plain = words ?? name;
  return list === 'head' ? capital(plain) : `${entryLabel(list, owner as Entry)}: ${plain}`;
}

export const entryLabel = (list: ListName, entry: Entry): string => nameOf(list, entry as never);

/** An entry with every field that is set, one on a line: "torque in N·m: 10 N·m". */
export function entryText(list: ListName, entry: Entry | undefined): string | null {
  if (!entry) return null;
  return Object.keys(FIELDS[list])
    .filter((name) => name !== 'key')
    .flatMap((name) => {
      const text = fieldText(list, name, entry);
      return text === null ? [] : [`${FIELDS[list][name] ?? name}: ${text}`];
    })
    .join('\n');
}

/** A step as it is written, with its title ahead. */
export const stepText = (step: Step | undefined): string | null =>
  step ? `${step.title}\n\n${step.body}`.trim() : null;
