import { ENTRY_FIELDS, isListName, type ListName } from '../../procedure/fields';
import { splitLines } from '../../procedure/source';
import type { Entry } from '../draft';

/** The front matter as far as its bare lines tell, so that it can be completed while it is too faulty to be read. */
export interface LooseHead {
  /** Names at its top level. */
  fields: string[];
  lists: Record<ListName, Entry[]>;
  engines: string[];
  /** Lines of the text that it takes, both fences included; all of them while its end is not written yet. */
  lines: number;
}

const TOP = /^([A-Za-z]+):(.*)$/;
const ITEM = /^\s*- +(.*)$/;
const FIELD = /^([A-Za-z]+):\s*(.*)$/;

/** A scalar without its quotes. */
const plain = (value: string) => value.trim().replace(/^(["'])(.*)\1$/, '$2');

const noLists = () =>
  Object.fromEntries(Object.keys(ENTRY_FIELDS).map((list) => [list, [] as Entry[]])) as unknown as Record<
    ListName,
    Entry[]
  >;

/** Lines of the front matter of a text; 0 where it has none. */
export function headLinesOf(text: string): number {
  const { lines, headLines } = splitLines(text);
  return headLines > 0 ? headLines : /^---[ \t]*$/.test(lines[0] ?? '') ? lines.length : 0;
}

/** Reads the lines of a front matter one by one; `upTo` stops after so many of them. */
export function looseHead(text: string, upTo = Infinity): LooseHead {
  const lines = headLinesOf(text);
  const head: LooseHead = { fields: [], lists: noLists(), engines: [], lines };
  let top = '';
  for (const line of text.split('\n').slice(1, Math.min(lines, upTo))) {
    const [, name] = TOP.exec(line) ?? [];
    if (name) {
      head.fields.push(name);
      top = name;
      continue;
    }
    const [, item] = ITEM.exec(line) ?? [];
    if (top === 'engines') {
      if (item) head.engines.push(plain(item));
      continue;
    }
    if (!isListName(top)) continue;
    const entries = head.lists[top];
    if (item !== undefined) entries.push({});
    const [, field, value = ''] = FIELD.exec((item ?? line).trim()) ?? [];
    const entry = entries.at(-1);
    if (field && entry) entry[field] = plain(value);
  }
  return head;
}
