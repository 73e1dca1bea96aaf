import type { List, Table } from 'mdast';
import { fillIn } from '../../procedure/fillIn';
import type { Frontmatter } from '../../procedure/schema';
import { freeSlug } from '../ids';
import { tidy, wordsOf } from './nodes';
import type { ListKind, Outline } from './outline';
import { leave, words, type Taking } from './prose';

type Row = Partial<Record<'name' | 'number' | 'quantity' | 'note' | 'range', string>>;
export type Entries = Pick<Frontmatter, ListKind>;

const COLUMNS: Record<ListKind, [RegExp, keyof Row][]> = {
  parts: [
    [/^(part|parts|name|item|description|part name)$/i, 'name'],
    [/^((part )?(number|no\.?)|#)$/i, 'number'],
    [/^(qty\.?|quantity|count|how many)$/i, 'quantity'],
    [/^(notes?|remarks?)$/i, 'note'],
  ],
  tools: [
    [/^(tool|tools|name|item|description)$/i, 'name'],
    [/^(range|size)$/i, 'range'],
    [/^(notes?|remarks?)$/i, 'note'],
  ],
  supplies: [
    [/^(supply|supplies|name|item|description|material)$/i, 'name'],
    [/^(notes?|remarks?)$/i, 'note'],
  ],
};
const MOST = { name: 90, number: 40, quantity: 3, note: 110, range: 60 } as const;

/** Rows of a table whose every column says what it holds; null for any other. */
function ofTable(node: Table, kind: ListKind): { rows: Row[]; heads: string } | null {
  const [head, ...body] = node.children;
  const heads = head?.children.map((cell) => tidy(wordsOf(cell.children))) ?? [];
  const fields = heads.map((text) => COLUMNS[kind].find(([pattern]) => pattern.test(text))?.[1]);
  if (!fields.includes('name') || fields.includes(undefined) || new Set(fields).size < fields.length) return null;
  const rows = body.map(({ children }) =>
    Object.fromEntries(children.map((cell, i) => [fields[i] ?? 'note', tidy(wordsOf(cell.children))])),
  );
  return { rows, heads: heads.join(' ') };
}

function ofList(node: List): Row[] | null {
  const rows = node.children.map(({ children }) => {
    const [only, ...more] = children;
    return only?.type === 'paragraph' && more.length === 0 ? { name: tidy(wordsOf(only.children)) } : null;
  });
  return rows.every((row) => row !== null) ? (rows as Row[]) : null;
}

const fits = (row: Row, kind: ListKind) =>
  (row.name ?? '') !== '' &&
  Object.entries(row).every(([field, text]) => text.length <= MOST[field as keyof Row]) &&
  (row.quantity === undefined || kind !== 'parts' || /^[1-9]\d{0,2}$/.test(row.quantity));

const notEmpty = <T extends object>(entry: T): T =>
  Object.fromEntries(Object.entries(entry).filter(([, value]) => value !== undefined && value !== '')) as T;

/**
 * The entries that a list or a table under a plain heading stands for, or null where one of them does not fit. What
 * the document does not say of a part, how many and what becomes of it, is left to fill in.
 */
export function plainEntries({ kind, heading, blocks }: Outline['lists'][number], c: Taking): Entries | null {
  const [block] = blocks;
  const table = block?.type === 'table' ? ofTable(block, kind) : null;
  const rows = table?.rows ?? (block?.type === 'list' ? ofList(block) : null);
  if (!rows || rows.length === 0 || rows.length > 30 || !rows.every((row) => fits(row, kind))) return null;
  // Pictures and addresses in the list are told like those of prose; its words stand in the entries.
  for (const node of block ? [block] : []) tellLost(node as List | Table, c);
  leave(c, 'Heading', `${tidy(wordsOf(heading))} ${table?.heads ?? ''}`, `the list of ${kind}`);
  const out: Entries = { parts: [], tools: [], supplies: [] };
  const taken: string[] = [];
  for (const row of rows) {
    const key = freeSlug(row.name ?? '', taken, kind.slice(0, 4));
    taken.push(key);
    const { name = '', number, quantity, note = '', range } = row;
    if (kind === 'tools') out.tools.push(notEmpty({ key, name, range, note }));
    else if (kind === 'supplies') out.supplies.push(notEmpty({ key, name, note }));
    else {
      const open = fillIn(quantity ? 'new, inspected or used again.' : 'how many; new, inspected or used again.');
      out.parts.push(
        notEmpty({
          key,
          name,
          number,
          quantity: Number(quantity ?? 1),
          action: 'inspect',
          note: tidy(`${note} ${open}`),
        }),
      );
    }
  }
  return out;
}

function tellLost(node: List | Table, c: Taking): void {
  const paragraphs =
    node.type === 'table'
      ? node.children.flatMap((row) => row.children.map((cell) => cell.children))
      : node.children.flatMap((item) =>
          item.children.flatMap((one) => (one.type === 'paragraph' ? [one.children] : [])),
        );
  for (const children of paragraphs)
    for (const word of words(children, c))
      if (word.type === 'link') leave(c, 'Address of a link', word.url, 'its words, without the link');
}
