import type { PhrasingContent, RootContent } from 'mdast';
import { isElement } from './attributes';
import { referenceOf, startsSentence, valueOf } from './references';
import type { Frontmatter } from './schema';

/** How a value is written out in plain words: in metric, or in both unit systems. */
export type Written = 'metric' | 'both';

export function plainWords(nodes: readonly PhrasingContent[], head: Frontmatter, written: Written): string {
  return nodes
    .map((node, i): string => {
      if (node.type === 'text' || node.type === 'inlineCode') return node.value;
      if (node.type === 'break') return ' ';
      if (isElement(node)) {
        const reference = referenceOf(node);
        const value = reference && valueOf(reference, head, startsSentence(nodes, i));
        if (value)
          return written === 'both' && value.inch !== value.metric ? `${value.metric} (${value.inch})` : value.metric;
      }
      return 'children' in node ? plainWords(node.children as PhrasingContent[], head, written) : '';
    })
    .join('');
}

/** Each block of cleaned nodes as a line of plain words: paragraphs, points of a list, rows of a table, captions. */
export function plainLinesOf(nodes: readonly RootContent[], head: Frontmatter): string[] {
  return nodes.flatMap((node): string[] => {
    switch (node.type) {
      case 'paragraph':
        return [plainWords(node.children, head, 'metric')];
      case 'tableRow':
        return [node.children.map((cell) => plainWords(cell.children, head, 'metric')).join(' ')];
      case 'mdxJsxFlowElement': {
        const reference = referenceOf(node);
        if (reference?.kind === 'figure')
          return head.figures.filter((f) => f.key === reference.key).map((f) => f.caption);
        if (reference?.kind !== 'worksheet') return [];
        return head.limits.filter((l) => reference.keys.includes(l.key)).map((l) => l.name);
      }
      default:
        return 'children' in node ? plainLinesOf(node.children as RootContent[], head) : [];
    }
  });
}
