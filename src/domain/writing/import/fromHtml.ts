import type { Element, ElementContent, Nodes as HastNodes, Root as HastRoot } from 'hast';
import type { Root, RootContent } from 'mdast';
import rehypeParse from 'rehype-parse';
import rehypeRemark, { type Options } from 'rehype-remark';
import { unified } from 'unified';
import { gridOf } from '../paste/grid';
import { foreignNode, paragraphOf, tidy } from './nodes';
import { offLine } from './offLine';

type Handle = NonNullable<Options['handlers']>[string];

const blockWords = (node: HastNodes): string =>
  node.type === 'text'
    ? node.value
    : 'children' in node
      ? node.children.map(blockWords).join(isBlock(node) ? ' ' : '')
      : '';
const isBlock = (node: HastNodes) =>
  node.type === 'element' &&
  ['ol', 'ul', 'li', 'table', 'tbody', 'thead', 'tr', 'td', 'th', 'dl', 'dd', 'dt'].includes(node.tagName);

/** Letters that cannot be raised or lowered stand on the line, and that is told. */
const offTheLine =
  (kind: 'sup' | 'sub'): Handle =>
  (_, node: Element) => {
    const text = blockWords(node);
    const value = offLine(kind, text);
    if (value !== null) return { type: 'text', value };
    const what = kind === 'sup' ? 'Raised letters' : 'Lowered letters';
    return [{ type: 'text', value: text }, foreignNode(what, text, 'the same letters on the line')];
  };

const isMerged = (node: HastNodes): boolean =>
  node.type === 'element' &&
  (Number(node.properties['colSpan'] ?? 1) > 1 ||
    Number(node.properties['rowSpan'] ?? 1) > 1 ||
    node.children.some(isMerged));

const cellsOf = (node: HastNodes): Element[] =>
  node.type !== 'element'
    ? []
    : node.tagName === 'td' || node.tagName === 'th'
      ? [node]
      : node.children.flatMap(cellsOf);
const nestedTable = (node: Element): boolean =>
  node.children.some((child) => child.type === 'element' && (child.tagName === 'table' || nestedTable(child)));

/**
 * A table with one cell is a frame round a text. One that holds lists, several paragraphs or another table in a cell
 * keeps their words in the cell, in one line, as Markdown has it; that is told.
 */
const tableHandler: Handle = (state, node: Element) => {
  const cells = cellsOf(node);
  const [only, ...more] = cells;
  if (only && more.length === 0) return state.toFlow(state.all(only)) as RootContent[];
  const told: RootContent[] = [];
  if (isMerged(node))
    told.push(paragraphOf(foreignNode('Merged cells of a table', '', 'single cells, some of them empty')));
  if (nestedTable(node)) {
    told.push(paragraphOf(foreignNode('Table inside a table', '', 'a line for each row')));
    const lines = cells
      .filter((cell) => !nestedTable(cell))
      .map(blockWords)
      .map(tidy)
      .filter(Boolean);
    const outside = cells
      .filter(nestedTable)
      .flatMap((cell) => cell.children.filter((c) => c.type !== 'element' || c.tagName !== 'table'));
    const loose = tidy(outside.map(blockWords).join(' '));
    return [
      ...told,
      ...[loose, ...lines].filter(Boolean).map((value) => ({ type: 'paragraph', children: [{ type: 'text', value }] })),
    ] as RootContent[];
  }
  if (cells.some((cell) => cell.children.some((c) => c.type === 'element' && ['ul', 'ol'].includes(c.tagName))))
    told.push(paragraphOf(foreignNode('List inside a cell', '', 'words in one line')));
  const rows = gridOf(rowsIn(node).map(cellsOf)).map((row) => ({
    type: 'tableRow',
    children: row.map((cell) => ({
      type: 'tableCell',
      children: cell ? state.all({ ...cell, children: cell.children.flatMap(inOneLine) }) : [],
    })),
  }));
  return [...told, { type: 'table', align: [], children: rows }] as RootContent[];
};

const rowsIn = (node: Element): Element[] =>
  node.children.flatMap((child) => (child.type !== 'element' ? [] : child.tagName === 'tr' ? [child] : rowsIn(child)));

/** What stands in a cell, its paragraphs and points one behind the other. */
function inOneLine(node: ElementContent): ElementContent[] {
  if (node.type !== 'element' || !['p', 'ul', 'ol', 'li', 'h1', 'h2', 'h3', 'h4', 'h5', 'h6'].includes(node.tagName))
    return [node];
  return [...node.children.flatMap(inOneLine), { type: 'text', value: ' ' }];
}

/** Links of a document to its own notes and comments; what they lead to stands at the end of it. */
const NOTE = /^#(footnote|endnote|comment)-/;
const NAMES: Record<string, string> = { footnote: 'Footnote', endnote: 'Endnote', comment: 'Comment' };

/** Marks of notes go; the notes themselves are told where their mark stood, so that the place is not lost. */
function takeNotes(root: HastRoot): void {
  const notes = new Map<string, string>();
  const collect = (node: HastRoot | Element): void => {
    node.children = node.children.filter((child) => {
      if (child.type !== 'element') return true;
      const id = String(child.properties['id'] ?? '');
      if (child.tagName === 'li' && /^(footnote|endnote)-(?!ref)/.test(id))
        notes.set(id, tidy(blockWords(child)).replace(/\s*↑\s*/g, ' '));
      else if (child.tagName === 'dt' && /^comment-(?!ref)/.test(id)) {
        const next = node.children[node.children.indexOf(child) + 1];
        notes.set(id, tidy(`${blockWords(child)} ${next ? blockWords(next) : ''}`).replace(/\s*↑\s*/g, ' '));
      } else if (child.tagName === 'dd' && node.type === 'element' && node.tagName === 'dl') return false;
      else {
        const before = child.children.length;
        collect(child);
        // A list of which nothing but notes was made is gone with them.
        return !(before > 0 && child.children.length === 0 && ['ol', 'dl'].includes(child.tagName));
      }
      return false;
    }) as typeof node.children;
  };
  collect(root);
  const place = (node: HastRoot | Element): void => {
    node.children = node.children.map((child) => {
      if (child.type !== 'element') return child;
      const [inside] = child.children;
      const href = inside?.type === 'element' ? String(inside.properties['href'] ?? '') : '';
      const kind = child.tagName === 'sup' ? NOTE.exec(href)?.[1] : undefined;
      if (kind === undefined) {
        place(child);
        return child;
      }
      const quote = notes.get(href.slice(1)) ?? '';
      notes.delete(href.slice(1));
      return noteElement(NAMES[kind] ?? 'Note', quote);
    }) as typeof node.children;
  };
  place(root);
  for (const [id, quote] of notes) root.children.push(noteElement(NAMES[id.split('-')[0] ?? ''] ?? 'Note', quote));
}

const noteElement = (what: string, quote: string): Element => ({
  type: 'element',
  tagName: 'x-left-out',
  properties: { what, quote },
  children: [],
});

const processor = unified()
  .use(rehypeParse, { fragment: true })
  .use(() => takeNotes)
  .use(rehypeRemark, {
    newlines: false,
    handlers: {
      sup: offTheLine('sup'),
      sub: offTheLine('sub'),
      table: tableHandler,
      'x-left-out': (_, { properties }: Element) =>
        foreignNode(String(properties['what']), String(properties['quote'])),
      // A field of a form in a document.
      input: (_, { properties }: Element) =>
        foreignNode('Box to tick', properties['checked'] ? 'ticked' : 'not ticked'),
      img: (_, { properties }: Element) => foreignNode('Picture', String(properties['alt'] ?? '')),
    },
  })
  .freeze();

/** The HTML that a document was turned into, as a tree of Markdown with `foreignNode`s where something has no place in it. */
export const fromHtml = (html: string): Root => processor.runSync(processor.parse(html)) as unknown as Root;
