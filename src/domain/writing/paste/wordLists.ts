import type { Element, ElementContent } from 'hast';
import { isElement, plainOf, styleOf } from './style';

/**
 * A word processor writes lists as paragraphs that say their level in their style (`mso-list: l0 level2 lfo1`) and
 * carry their bullet or number as hidden words (`mso-list: Ignore`).
 */
interface Item {
  level: number;
  ordered: boolean;
  start: number;
  content: ElementContent[];
}

function markerOf(nodes: readonly ElementContent[]): string | null {
  for (const node of nodes) {
    if (!isElement(node)) continue;
    if (styleOf(node)['mso-list'] === 'ignore') return plainOf(node.children).replace(/[\s\u00a0]+/g, '');
    const inside = markerOf(node.children);
    if (inside !== null) return inside;
  }
  return null;
}

const NUMBER = /^\(?(\d+|[a-z]|[ivxl]+)[.)]$/i;

function itemOf(node: ElementContent): Item | null {
  if (!isElement(node)) return null;
  const list = styleOf(node)['mso-list'];
  if (!list || list === 'none' || list === 'ignore') return null;
  // A numbered heading says its list too, and is a heading all the same.
  if (node.tagName !== 'p' && node.tagName !== 'div' && node.tagName !== 'li') return null;
  const marker = markerOf(node.children) ?? '';
  const number = NUMBER.exec(marker)?.[1];
  return {
    level: Math.max(1, Number(/level(\d+)/.exec(list)?.[1] ?? 1)),
    ordered: number !== undefined,
    start: number !== undefined && /^\d+$/.test(number) ? Number(number) : 1,
    content: node.children,
  };
}

const element = (tagName: string, children: ElementContent[], properties: Element['properties'] = {}): Element => ({
  type: 'element',
  tagName,
  properties,
  children,
});

const isBlank = (node: ElementContent) => node.type === 'comment' || (node.type === 'text' && node.value.trim() === '');

/** One list from items that follow each other; deeper ones stand inside the item before them. */
function listOf(items: readonly Item[]): Element[] {
  const out: Element[] = [];
  const [first] = items;
  if (!first) return out;
  const level = Math.min(...items.map((item) => item.level));
  let list: { node: Element; ordered: boolean } | undefined;
  for (let i = 0; i < items.length;) {
    const item = items[i];
    if (!item) break;
    let deeper = i + 1;
    if (item.level > level) {
      // A list that begins deeper than it goes on.
      deeper = items.findIndex((other, n) => n > i && other.level <= level);
      const inner = items.slice(i, deeper < 0 ? items.length : deeper);
      out.push(...listOf(inner));
      list = undefined;
      i += inner.length;
      continue;
    }
    while ((items[deeper]?.level ?? 0) > level) deeper += 1;
    const node: Element = element('li', [element('p', item.content), ...listOf(items.slice(i + 1, deeper))]);
    if (list && list.ordered === item.ordered) list.node.children.push(node);
    else {
      const start: Element['properties'] = item.ordered && item.start !== 1 ? { start: item.start } : {};
      list = { node: element(item.ordered ? 'ol' : 'ul', [node], start), ordered: item.ordered };
      out.push(list.node);
    }
    i = deeper;
  }
  return out;
}

/** The same nodes with such paragraphs put together to real lists. */
export function withRealLists(nodes: readonly ElementContent[]): ElementContent[] {
  const out: ElementContent[] = [];
  let items: Item[] = [];
  const flush = () => {
    out.push(...listOf(items));
    items = [];
  };
  for (const node of nodes) {
    const item = itemOf(node);
    if (item) items.push(item);
    else if (!isBlank(node) || items.length === 0) {
      flush();
      out.push(isElement(node) ? { ...node, children: withRealLists(node.children) } : node);
    }
  }
  flush();
  return out;
}
