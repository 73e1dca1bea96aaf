import type { AlignType, ListItem, RootContent, TableCell } from 'mdast';
import type { MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import type { Node } from 'prosemirror-model';
import { isChip } from './schema';
import { elementOf, wordsOf } from './wordsTree';

const childrenOf = (node: Node): Node[] => {
  const children: Node[] = [];
  node.forEach((child) => children.push(child));
  return children;
};

const blocks = (node: Node): RootContent[] => childrenOf(node).flatMap(block);

function list(node: Node): RootContent[] {
  const items = childrenOf(node).map((item): ListItem => ({
    type: 'listItem',
    spread: false,
    children: blocks(item) as ListItem['children'],
  }));
  // A paragraph that follows anything in its point needs a blank line before it.
  const needsRoom = items.some(({ children }) => children.some((child, i) => i > 0 && child.type === 'paragraph'));
  const loose =
    needsRoom ||
    (node.attrs['spread'] === true && (items.length > 1 || items.some(({ children }) => children.length > 1)));
  for (const item of items) item.spread = loose;
  const ordered = node.type.name === 'ordered_list';
  const start = ordered ? { start: node.attrs['order'] as number } : {};
  return [{ type: 'list', ordered, ...start, spread: loose, children: items }];
}

function table(node: Node): RootContent[] {
  const rows = childrenOf(node).map(childrenOf);
  const columns = Math.max(...rows.map((row) => row.length));
  const align = Array.from({ length: columns }, (_, i) => (rows[0]?.[i]?.attrs['align'] as AlignType) ?? null);
  const children = rows.map((row) => ({
    type: 'tableRow' as const,
    children: Array.from({ length: columns }, (_, i): TableCell => {
      const cell = row[i];
      return { type: 'tableCell', children: cell ? wordsOf(cell) : [] };
    }),
  }));
  return [{ type: 'table', align, children }];
}

function block(node: Node): RootContent[] {
  if (isChip(node)) return [{ type: 'mdxJsxFlowElement', ...elementOf(node) }];
  switch (node.type.name) {
    case 'Hold': {
      const hold = { type: 'mdxJsxTextElement', name: 'Hold', attributes: [], children: wordsOf(node) };
      return [{ type: 'paragraph', children: [hold as MdxJsxTextElement] }];
    }
    case 'bullet_list':
    case 'ordered_list':
      return list(node);
    case 'table':
      return table(node);
    case 'blockquote': {
      const children = blocks(node);
      return children.length ? [{ type: 'blockquote', children: children as ListItem['children'] }] : [];
    }
    default: {
      const children = wordsOf(node);
      return children.length ? [{ type: 'paragraph', children }] : [];
    }
  }
}

/** A passage of a field as tidied nodes of a sheet: none for a paragraph or a quotation that says nothing. */
export const treeOf = (passage: Node): RootContent[] => block(passage);
