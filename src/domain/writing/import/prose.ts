import type { Link, List, ListItem, Nodes, Parent, PhrasingContent, RootContent, Table, TableCell } from 'mdast';
import type { LeftOut } from '../../api/schemas/imports';
import { BOUNDS } from '../../procedure/bounds';
import { forbiddenCharacter } from '../../procedure/characters';
import { linkFault, plainAddress } from '../../procedure/links';
import { tidyInside, tidyWords } from '../../procedure/phrasing';
import { isModuleLine } from '../../procedure/refusals';
import { paragraphOf, tidy, wordsOf } from './nodes';
import { offLine } from './offLine';

/** What the taking over of a passage carries along. */
export interface Taking {
  leftOut: LeftOut[];
  /** Title of the step, or the part of the document, for a reader. */
  where: string;
  /** Addresses of Markdown's link definitions, by name. */
  definitions: ReadonlyMap<string, string>;
}

const LONGEST_QUOTE = 60_000;

export function leave(c: Taking, what: string, quote: string, became: string | null = null): never[] {
  c.leftOut.push({ what, where: c.where.slice(0, 200), quote: tidy(quote).slice(0, LONGEST_QUOTE), became });
  return [];
}

/** Control characters and marks that turn the direction of writing are taken out of words; a sheet refuses them. */
function plainText(value: string, c: Taking): string {
  const line = value.replace(/\n/g, ' ');
  if (forbiddenCharacter(line) === null) return value;
  const clean = Array.from(line, (sign) => (forbiddenCharacter(sign) === null ? sign : '')).join('');
  leave(c, 'Unseen characters', clean, 'the same words without them');
  return clean;
}

function link(node: Link, c: Taking, inside: readonly string[]): PhrasingContent[] {
  const plain = plainAddress(node);
  if (plain !== null) return [{ type: 'text', value: plainText(plain, c) }];
  const children = tidyWords(words(node.children, c, [...inside, 'link']));
  if (node.title) leave(c, 'Words behind a link', node.title);
  if (inside.includes('link') || linkFault(node.url) !== null) {
    leave(c, 'Address of a link', node.url, 'its words, without the link');
    return children;
  }
  if (children.length > 0) return [{ type: 'link', url: node.url, children: children as Link['children'] }];
  return leave(c, 'Address of a link', node.url);
}

const endsInDigit = (nodes: readonly PhrasingContent[]) => /\d$/.test(wordsOf(nodes));

/** A raised or lowered figure, or a new line, that was written as HTML; with how many nodes it takes. */
function knownHtml(nodes: readonly PhrasingContent[], i: number): { node: PhrasingContent; length: number } | null {
  const [open, text, close] = [nodes[i], nodes[i + 1], nodes[i + 2]];
  if (open?.type !== 'html') return null;
  if (/^<br\s*\/?>$/i.test(open.value)) return { node: { type: 'break' }, length: 1 };
  const kind = /^<(sup|sub)>$/i.exec(open.value)?.[1]?.toLowerCase() as 'sup' | 'sub' | undefined;
  if (kind === undefined || text?.type !== 'text' || close?.type !== 'html') return null;
  const value = close.value.toLowerCase() === `</${kind}>` ? offLine(kind, text.value) : null;
  return value === null ? null : { node: { type: 'text', value }, length: 3 };
}

/** The words of a paragraph or a cell, as far as a sheet can hold them. */
export function words(nodes: readonly PhrasingContent[], c: Taking, inside: readonly string[] = []): PhrasingContent[] {
  const out: PhrasingContent[] = [];
  let gap = false;
  for (let i = 0; i < nodes.length; i += 1) {
    const known = knownHtml(nodes, i);
    if (known) {
      leave(
        c,
        'HTML',
        nodes
          .slice(i, i + known.length)
          .flatMap((node) => (node.type === 'html' ? node.value : []))
          .join(' '),
        'the same without it',
      );
      i += known.length - 1;
    }
    const taken = known ? [known.node] : word(nodes[i] as PhrasingContent, c, inside);
    // What is left out between two figures must not make one number of them.
    if (gap && endsInDigit(out) && /^\d/.test(wordsOf(taken))) out.push({ type: 'text', value: ' ' });
    gap = taken.length === 0 || (gap && wordsOf(taken) === '');
    out.push(...taken);
  }
  return out;
}

function word(node: PhrasingContent, c: Taking, inside: readonly string[]): PhrasingContent[] {
  switch (node.type) {
    case 'text':
      return [{ type: 'text', value: plainText(node.value, c) }];
    case 'break':
      return [{ type: 'break' }];
    case 'inlineCode':
      return [{ type: 'inlineCode', value: plainText(node.value, c) }];
    case 'emphasis':
    case 'strong': {
      const children = words(node.children, c, [...inside, node.type]);
      const edges = wordsOf(children);
      // Emphasis that begins or ends with a blank could not be written back.
      if (inside.includes(node.type) || edges !== edges.trim() || edges === '') return children;
      return [{ type: node.type, children: tidyInside(children) }];
    }
    case 'link':
      return link(node, c, inside);
    case 'linkReference': {
      const url = c.definitions.get(node.identifier);
      if (url !== undefined) return link({ type: 'link', url, children: node.children }, c, inside);
      return words(node.children, c, inside);
    }
    case 'delete':
      return leave(c, 'Words that were struck through', wordsOf(node.children));
    case 'image':
      if (node.data?.foreign)
        return leave(c, node.data.foreign.what, node.data.foreign.quote, node.data.foreign.became);
      return leave(
        c,
        'Picture',
        [node.alt ?? '', node.title ?? '', /^(data:|$)/.test(node.url) ? '' : node.url].join(' '),
      );
    case 'imageReference':
      return leave(c, 'Picture', `${node.alt ?? ''} ${c.definitions.get(node.identifier) ?? node.label ?? ''}`);
    case 'footnoteReference':
      return leave(c, 'Mark of a footnote', node.label ?? node.identifier);
    case 'html':
      return leave(c, 'HTML', node.value);
    default:
      return leave(c, 'Unknown passage', wordsOf(node as Nodes));
  }
}

function list(node: List, c: Taking, depth: number): RootContent[] {
  const children = node.children.flatMap((item): ListItem[] => {
    if (typeof item.checked === 'boolean')
      leave(c, 'Box to tick', `${item.checked ? 'x ' : ''}${wordsOf(item.children)}`, 'a point of the list');
    const inside = prose(item.children, c, depth + 1);
    if (inside.length === 0) return [];
    return [{ type: 'listItem', spread: item.spread === true, children: inside as ListItem['children'] }];
  });
  if (children.length === 0) return [];
  const loose =
    children.some((item) => item.spread && item.children.length > 1) || (node.spread === true && children.length > 1);
  for (const item of children) item.spread = loose;
  const start = node.ordered ? { start: node.start ?? 1 } : {};
  return [{ type: 'list', ordered: node.ordered === true, ...start, spread: loose, children }];
}

/** Each row as a line, where a table cannot stand. */
const rowsAsLines = (rows: readonly { children: readonly TableCell[] }[]): RootContent[] =>
  rows.flatMap(({ children }) => {
    const cells = children.map((cell) => tidyWords([...cell.children])).filter((cell) => cell.length > 0);
    const line = cells.flatMap((cell, i): PhrasingContent[] =>
      i === 0 ? cell : [{ type: 'text', value: '; ' }, ...cell],
    );
    return line.length ? [paragraphOf(...line)] : [];
  });

function table(node: Table, c: Taking): RootContent[] {
  const rows = node.children.map((row) => ({
    type: 'tableRow' as const,
    children: row.children.map((cell): TableCell => ({
      type: 'tableCell',
      children: tidyWords(words(cell.children, c)),
    })),
  }));
  const columns = Math.max(0, ...rows.map((row) => row.children.length));
  if (columns > BOUNDS.columns || columns * rows.length > 400) {
    leave(c, 'Large table', '', 'a line for each row');
    return rowsAsLines(rows);
  }
  for (const row of rows) while (row.children.length < columns) row.children.push({ type: 'tableCell', children: [] });
  if (rows.every((row) => row.children.every((cell) => cell.children.length === 0))) return [];
  return [{ type: 'table', align: rows[0]?.children.map(() => null) ?? [], children: rows }];
}

const DEEPEST_LIST = 4;

/** Paragraphs, lists, quotations and tables, as far as a sheet can hold them; the rest is told in `c.leftOut`. */
export function prose(nodes: readonly RootContent[], c: Taking, depth = 0): RootContent[] {
  return nodes.flatMap((node): RootContent[] => {
    switch (node.type) {
      case 'paragraph': {
        const children = tidyWords(words(node.children, c));
        const [first] = children;
        // Words such as "import x from" would be read as a program elsewhere and are refused at the start of a line.
        if (first?.type === 'text' && isModuleLine(first.value))
          return leave(c, 'Line of a program', wordsOf(children));
        return children.length ? [paragraphOf(...children)] : [];
      }
      case 'heading':
        leave(c, 'Heading inside a step', wordsOf(node), 'a line in bold');
        return prose([boldLine(node.children)], c, depth);
      case 'list':
        if (depth < DEEPEST_LIST) return list(node, c, depth);
        leave(c, 'List that is nested too deeply', '', 'paragraphs');
        return prose(
          node.children.flatMap((item) => item.children),
          c,
          depth,
        );
      case 'blockquote': {
        const children = prose(node.children, c, depth + 1);
        return children.length ? [{ type: 'blockquote', children: children as typeof node.children }] : [];
      }
      case 'table':
        return depth === 0 ? table(node, c) : rowsAsLines(tableInside(node, c));
      case 'code':
        return leave(c, 'Code', [node.lang ?? '', node.meta ?? '', node.value].join(' '));
      case 'html':
        return leave(c, 'HTML', node.value);
      case 'yaml':
        return leave(c, 'Fields above the text', node.value);
      case 'definition':
        return node.title ? leave(c, 'Words behind a link', node.title) : [];
      case 'footnoteDefinition':
        return leave(c, 'Footnote', `${node.label ?? node.identifier} ${wordsOf(node.children)}`);
      case 'thematicBreak':
        return [];
      default:
        return 'children' in node
          ? leave(c, 'Unknown passage', wordsOf((node as Parent).children as Nodes[]))
          : leave(c, 'Unknown passage', wordsOf(node as Nodes));
    }
  });
}

function tableInside(node: Table, c: Taking) {
  leave(c, 'Table inside a list or a quotation', '', 'a line for each row');
  return node.children.map((row) => ({
    children: row.children.map((cell): TableCell => ({
      type: 'tableCell',
      children: words(cell.children, c) as TableCell['children'],
    })),
  }));
}

export function boldLine(children: readonly PhrasingContent[]): RootContent {
  const inside = children.flatMap((child) => (child.type === 'strong' ? child.children : [child]));
  return paragraphOf({ type: 'strong', children: inside });
}
