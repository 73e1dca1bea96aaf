import type { Paragraph, PhrasingContent, RootContent } from 'mdast';
import type { MdxJsxFlowElement, MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import { componentOf } from './components';
import { problem } from './problems';
import type { SourceProblem } from './types';

/**
 * Markdown puts a component into a paragraph or on its own by where its line breaks stand. These bring
 * each to where it belongs: `lifted` takes out what stands alone, `gathered` puts together what makes a sentence.
 */

const standsAlone = (node: PhrasingContent): node is MdxJsxTextElement =>
  node.type === 'mdxJsxTextElement' && ['block', 'step'].includes(componentOf(node.name)?.stands ?? '');
const isBlank = (node: PhrasingContent) => node.type === 'text' && node.value.trim() === '';

/**
 * Components that stand on their own, taken out of the paragraph that Markdown puts them in when
 * they are written on one line. A paragraph that mixes them with words stays, and is reported later.
 */
export function lifted(nodes: readonly RootContent[]): RootContent[] {
  return nodes.flatMap((node): RootContent[] => {
    if (node.type !== 'paragraph' || !node.children.some(standsAlone)) return [node];
    if (!node.children.every((child) => standsAlone(child) || isBlank(child))) return [node];
    return node.children.filter(standsAlone).map((child): MdxJsxFlowElement => {
      const { name, attributes } = child;
      const inside = child.children;
      const children = inside.length
        ? [{ type: 'paragraph' as const, children: inside, ...(child.position && { position: child.position }) }]
        : [];
      return {
        type: 'mdxJsxFlowElement',
        name,
        attributes,
        children,
        ...(child.position && { position: child.position }),
      };
    });
  });
}

const isSentencePart = (node: RootContent | undefined): node is MdxJsxFlowElement =>
  node?.type === 'mdxJsxFlowElement' && componentOf(node.name)?.stands === 'sentence';

/** A value alone on a line in the middle of a wrapped sentence would tear the sentence apart. */
function reportTorn(nodes: readonly RootContent[], c: { problems: SourceProblem[]; path: string }): void {
  nodes.forEach((node, i) => {
    if (!isSentencePart(node)) return;
    const before = nodes[i - 1];
    const after = nodes[i + 1];
    const touches =
      (before?.type === 'paragraph' && before.position?.end.line === (node.position?.start.line ?? 0) - 1) ||
      (after?.type === 'paragraph' && after.position?.start.line === (node.position?.end.line ?? 0) + 1);
    if (touches)
      c.problems.push(
        problem(
          node.position?.start,
          `${node.name} stands inside a sentence. Write it on the same line as its words.`,
          c.path,
        ),
      );
  });
}

/**
 * Values that stand alone on a line, as in a list of parts, become a paragraph; several on one line become one.
 * A value alone on a line in the middle of a wrapped sentence is reported.
 */
export function gathered(nodes: readonly RootContent[], c: { problems: SourceProblem[]; path: string }): RootContent[] {
  reportTorn(nodes, c);
  const out: RootContent[] = [];
  let line: { sentence: Paragraph; last: MdxJsxFlowElement } | null = null;
  for (const node of nodes) {
    if (!isSentencePart(node)) {
      line = null;
      out.push(node);
      continue;
    }
    const part = { ...node, type: 'mdxJsxTextElement', children: node.children as unknown } as MdxJsxTextElement;
    const from = node.position?.start;
    const to = line?.last.position?.end;
    if (line && from && to && from.line === to.line) {
      const gap: PhrasingContent[] = from.column > to.column ? [{ type: 'text', value: ' ' }] : [];
      line.sentence.children.push(...gap, part);
      line.last = node;
    } else {
      line = {
        sentence: { type: 'paragraph', children: [part], ...(node.position && { position: node.position }) },
        last: node,
      };
      out.push(line.sentence);
    }
  }
  return out;
}
