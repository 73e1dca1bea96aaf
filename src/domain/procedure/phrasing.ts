import type { PhrasingContent, Text } from 'mdast';

/** Tidying of words inside one paragraph or cell, so that the same sentence is always written the same. */

const isText = (node: PhrasingContent | undefined): node is Text => node?.type === 'text';

function joined(nodes: PhrasingContent[]): PhrasingContent[] {
  const out: PhrasingContent[] = [];
  for (const node of nodes) {
    const last = out.at(-1);
    if (isText(node) && isText(last)) out[out.length - 1] = { ...last, value: last.value + node.value };
    else out.push(node);
  }
  return out.map((n) => (isText(n) ? { ...n, value: n.value.replace(/[ \t\n]+/g, ' ') } : n));
}

function trimmed(nodes: PhrasingContent[]): PhrasingContent[] {
  const last = nodes.length - 1;
  return nodes
    .map((node, i) => {
      if (!isText(node)) return node;
      let { value } = node;
      if (i === 0 || nodes[i - 1]?.type === 'break') value = value.trimStart();
      if (i === last || nodes[i + 1]?.type === 'break') value = value.trimEnd();
      return { ...node, value };
    })
    .filter((node) => !isText(node) || node.value !== '');
}

/** Breaks at the edges and doubled breaks say nothing. */
function withoutIdleBreaks(nodes: PhrasingContent[]): PhrasingContent[] {
  const single = nodes.filter((node, i) => node.type !== 'break' || nodes[i - 1]?.type !== 'break');
  return single.filter((node, i) => node.type !== 'break' || (i > 0 && i < single.length - 1));
}

/** Soft line ends become spaces, runs of spaces one; edges are trimmed. */
export const tidyWords = (nodes: PhrasingContent[]) => withoutIdleBreaks(trimmed(joined(nodes)));

/** Inside emphasis, strong text and links: joined only, the space at an edge is kept for the words around. */
export const tidyInside = (nodes: PhrasingContent[]) =>
  joined(nodes).filter((node) => !isText(node) || node.value !== '');
