import type { Nodes, Parents, RootContent } from 'mdast';
import type { Node } from 'prosemirror-model';
import { writeMarkdown } from '../../procedure/markdown';
import { readWords } from './readWords';
import type { Where } from './schema';
import { treeOf } from './toTree';

/** Nodes in one shape whatever wrote them: without places, fields in one order. */
const meaning = (nodes: readonly RootContent[]) =>
  JSON.stringify(nodes, (key, value: unknown) =>
    key === 'position'
      ? undefined
      : typeof value === 'object' && value !== null && !Array.isArray(value)
        ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
        : value,
  );

type Change = (node: Nodes) => Nodes[];

const changed = <N extends Nodes>(nodes: readonly N[], change: Change): N[] =>
  nodes.flatMap((node) =>
    change(
      'children' in node
        ? ({ ...node, children: changed((node as Parents).children as Nodes[], change) } as Nodes)
        : node,
    ),
  ) as N[];

const spread: Change = (node) => {
  if (node.type !== 'list') return [node];
  const loose = node.children.length > 1 || node.children.some(({ children }) => children.length > 1);
  return [{ ...node, spread: loose, children: node.children.map((item) => ({ ...item, spread: loose })) }];
};
/** A value alone on a line would tear its sentence apart, so its line break goes. */
const onOneLine: Change = (node) => (node.type === 'break' ? [{ type: 'text', value: ' ' }] : [node]);
/** Half an address, such as "www._a_", reads as one with its escapes in it; set as typed, its letters stand as they are. */
const asTyped: Change = (node) =>
  node.type === 'text'
    ? node.value
        .split(/(\S*(?:www\.|:\/\/|@)\S*)/i)
        .filter(Boolean)
        .map((value): Nodes => ({ type: /www\.|:\/\/|@/i.test(value) ? 'inlineCode' : 'text', value }))
    : [node];
const plain: Change = (node) =>
  node.type === 'emphasis' || node.type === 'strong' || node.type === 'link' ? node.children : [node];

/** What is given up, in turn, where a passage does not come back from the text as it stands in the field. */
const GIVEN_UP: readonly (readonly Change[])[] = [
  [spread],
  [onOneLine],
  [spread, onOneLine],
  [asTyped],
  [spread, onOneLine, asTyped],
  [spread, onOneLine, asTyped, plain],
];

const comesBack = (nodes: readonly RootContent[], text: string, where: Where): boolean => {
  const read = readWords(text, where);
  return read.ok && meaning(joinedText(read.nodes)) === meaning(joinedText(nodes));
};

/** Texts beside each other are one text, however they came to stand there. */
const joinedText = (nodes: readonly RootContent[]): RootContent[] =>
  changed(nodes, (node) => {
    if (!('children' in node)) return [node];
    const children: Nodes[] = [];
    for (const child of (node as Parents).children as Nodes[]) {
      const last = children.at(-1);
      if (child.type === 'text' && last?.type === 'text')
        children[children.length - 1] = { ...last, value: last.value + child.value };
      else children.push(child);
    }
    return [{ ...node, children } as Nodes];
  });

function settled(block: RootContent, where: Where): RootContent[] {
  for (const changes of [[], ...GIVEN_UP]) {
    const nodes = changes.reduce<RootContent[]>((rest, change) => changed(rest, change), [block]);
    if (comesBack(nodes, writeMarkdown(nodes), where)) return nodes;
  }
  // What still cannot be read, the check names at the field.
  return [block];
}

/** A passage of a document never changes, so it is settled once, and a letter typed costs one passage. */
const known = new WeakMap<Node, RootContent[]>();

function settledOf(passage: Node, where: Where): RootContent[] {
  const before = known.get(passage);
  if (before) return before;
  const made = treeOf(passage).flatMap((block) => settled(block, where));
  known.set(passage, made);
  return made;
}

/**
 * The canonical text of a field's document. Some things can be made in a field that no text says, such as a value alone
 * on the second line of a sentence: then the nearest that reads back is written, and no word or value is ever left out.
 */
export function writeWords(document: Node, where: Where): string {
  const tree: RootContent[] = [];
  document.forEach((passage) => tree.push(...settledOf(passage, where)));
  return writeMarkdown(tree);
}
