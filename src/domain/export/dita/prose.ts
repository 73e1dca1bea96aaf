import type { Element, ElementContent, Root, RootContent } from 'hast';
import rehypeParse from 'rehype-parse';
import { unified } from 'unified';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { xmlText } from '../xmlText';
import { bothWords, element } from './nodes';

/** Where a link and a drawing of the sheet are found from the document that is made. */
export interface Places {
  link: (url: string) => { href: string; scope: 'external' | 'local' };
  figure: (file: string) => { href: string; scope: 'external' | 'local' };
}

// Our own rendering, never an author's HTML: a closed set of elements.
const html = unified().use(rehypeParse, { fragment: true }).freeze();

type Node = RootContent | ElementContent;
const isElement = (node: Node): node is Element => node.type === 'element';
const childrenOf = (node: Element | Root, name: string): Element[] =>
  (node.children as Node[]).filter((child): child is Element => isElement(child) && child.tagName === name);

function textOf(node: Node | Root): string {
  if (node.type === 'text') return node.value;
  return 'children' in node ? node.children.map(textOf).join('') : '';
}

const SAME: Readonly<Record<string, string>> = {
  p: 'p',
  ul: 'ul',
  ol: 'ol',
  li: 'li',
  em: 'i',
  strong: 'b',
  code: 'codeph',
  blockquote: 'lq',
};

/** Elements between whose children the blanks of the HTML mean nothing. */
const STRICT = new Set(['ul', 'ol']);

function value(parent: XMLBuilder, node: Element): void {
  const of = (system: string) => childrenOf(node, 'span').find(({ properties }) => properties['dataUnits'] === system);
  const [metric, inch] = [of('metric'), of('inch')];
  const words = metric && inch ? bothWords({ metric: textOf(metric), inch: textOf(inch) }) : textOf(node);
  element(parent, 'ph', { outputclass: String(node.properties['dataKind'] ?? 'value') }, words);
}

function figure(parent: XMLBuilder, node: Element, places: Places): void {
  const [image] = childrenOf(node, 'img');
  const [caption] = childrenOf(node, 'figcaption');
  const made = element(parent, 'fig');
  if (caption) element(made, 'title', {}, textOf(caption));
  const file = String(image?.properties['src'] ?? '').replace(/^.*\//, '');
  const { href, scope } = places.figure(file);
  element(
    element(made, 'image', { href, scope, placement: 'break' }),
    'alt',
    {},
    String(image?.properties['alt'] ?? ''),
  );
}

function htmlTable(parent: XMLBuilder, node: Element, places: Places): void {
  const made = element(parent, 'table');
  const [caption] = childrenOf(node, 'caption');
  if (caption) element(made, 'title', {}, textOf(caption));
  const rows = (part: Element | undefined) => (part ? childrenOf(part, 'tr') : []);
  const [head] = childrenOf(node, 'thead');
  const [body] = childrenOf(node, 'tbody');
  const cells = (row: Element) => row.children.filter((cell): cell is Element => isElement(cell));
  const all = [...rows(head), ...rows(body)];
  const group = element(made, 'tgroup', { cols: String(Math.max(1, ...all.map((row) => cells(row).length))) });
  const write = (part: XMLBuilder, row: Element) => {
    const to = element(part, 'row');
    for (const cell of cells(row)) writeNodes(element(to, 'entry'), cell.children, places);
  };
  if (rows(head).length > 0) {
    const part = element(group, 'thead');
    for (const row of rows(head)) write(part, row);
  }
  const part = element(group, 'tbody');
  const below = rows(body);
  for (const row of below) write(part, row);
  // A table with headings alone is no table of DITA; an empty row keeps it one.
  if (below.length === 0) element(element(part, 'row'), 'entry');
}

function link(parent: XMLBuilder, node: Element, places: Places): void {
  const { href, scope } = places.link(String(node.properties['href'] ?? ''));
  writeNodes(
    element(parent, 'xref', { href, scope, format: scope === 'local' ? 'dita' : 'html' }),
    node.children,
    places,
  );
}

function writeNodes(parent: XMLBuilder, nodes: readonly Node[], places: Places, strict = false): void {
  for (const node of nodes) {
    if (node.type === 'text') {
      if (!strict || node.value.trim()) parent.txt(xmlText(node.value));
      continue;
    }
    if (!isElement(node)) continue;
    const { tagName, properties, children } = node;
    const name = SAME[tagName];
    if (name) writeNodes(element(parent, name), children, places, STRICT.has(tagName));
    else if (tagName === 'span' && properties['dataKind'] !== undefined) value(parent, node);
    else if (tagName === 'figure') figure(parent, node, places);
    else if (tagName === 'table') htmlTable(parent, node, places);
    else if (tagName === 'a') link(parent, node, places);
    else if (tagName === 'br') parent.txt(' ');
    else writeNodes(parent, children, places);
  }
}

/** Writes the rendered words of a step or an introduction as DITA: paragraphs, lists, tables, drawings, values in both units. */
export function writeProse(parent: XMLBuilder, rendered: string, places: Places): void {
  const root: Root = html.parse(rendered);
  // Blanks between blocks say nothing; the words stand in the blocks.
  writeNodes(parent, root.children, places, true);
}
