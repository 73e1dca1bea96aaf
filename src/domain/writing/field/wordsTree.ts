import type { Break, Emphasis, InlineCode, Link, PhrasingContent, Strong, Text } from 'mdast';
import type { MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import type { Mark, Node } from 'prosemirror-model';
import { withoutForbidden } from '../../procedure/characters';
import { tidyInside, tidyWords } from '../../procedure/phrasing';
import { givenOf, isChip } from './schema';

/**
 * A field's words carry flat marks; a text nests them. This builds the nesting: the longest stretch stands outside, and
 * of two equal ones that which stood outside before. What came from a text and was not touched comes back as it was.
 */

interface Leaf {
  node: Text | Break | InlineCode | MdxJsxTextElement;
  marks: readonly Mark[];
}

type Marked = Emphasis | Strong | Link;

export const elementOf = (node: Node) => ({
  name: node.type.name,
  attributes: Object.entries(givenOf(node)).map(([name, value]) => ({ type: 'mdxJsxAttribute' as const, name, value })),
  children: [],
});

function leafOf(node: Node): Leaf[] {
  const marks = node.marks.filter((mark) => mark.type.name !== 'code');
  if (isChip(node)) return [{ node: { type: 'mdxJsxTextElement', ...elementOf(node) }, marks }];
  if (!node.isText) return [{ node: { type: 'break' }, marks }];
  const value = withoutForbidden(node.text ?? '');
  if (value === '') return [];
  return [{ node: { type: marks.length === node.marks.length ? 'text' : 'inlineCode', value }, marks }];
}

const sameBut = (a: Mark, b: Mark) =>
  a.type === b.type && a.attrs['href'] === b.attrs['href'] && (a.attrs['span'] === 0 || b.attrs['span'] === 0);

/** A stretch that was made beside one of the same kind is one with it. */
function joinedMarks(leaves: readonly Leaf[]): Leaf[] {
  const out = leaves.map((leaf) => ({ ...leaf }));
  const take = (leaf: Leaf | undefined, from: Leaf | undefined) => {
    if (leaf && from)
      leaf.marks = leaf.marks.map((mark) =>
        mark.attrs['span'] === 0 ? (from.marks.find((other) => sameBut(mark, other)) ?? mark) : mark,
      );
  };
  for (let i = 1; i < out.length; i += 1) take(out[i], out[i - 1]);
  for (let i = out.length - 2; i >= 0; i -= 1) take(out[i], out[i + 1]);
  return out;
}

const isLoose = (node: PhrasingContent | undefined) =>
  node?.type === 'break' || (node?.type === 'text' && node.value.trim() === '');

/** Takes blanks and line breaks at the edges out: signs of emphasis do not stand beside a blank. */
function withEdgesOut(nodes: PhrasingContent[]): {
  before: PhrasingContent[];
  inside: PhrasingContent[];
  after: PhrasingContent[];
} {
  const split = nodes.flatMap((node, i): PhrasingContent[] => {
    if (node.type !== 'text' || (i > 0 && i < nodes.length - 1)) return [node];
    const [, lead = '', rest = '', tail = ''] = /^(\s*)([^]*?)(\s*)$/.exec(node.value) ?? [];
    return [lead, rest, tail].filter(Boolean).map((value) => ({ type: 'text', value }));
  });
  let from = 0;
  let to = split.length;
  while (from < to && isLoose(split[from])) from += 1;
  while (to > from && isLoose(split[to - 1])) to -= 1;
  return { before: split.slice(0, from), inside: split.slice(from, to), after: split.slice(to) };
}

function wrapped(mark: Mark, children: PhrasingContent[]): PhrasingContent[] {
  const link = mark.type.name === 'link';
  const { before, inside, after } =
    mark.attrs['edges'] === true && !link
      ? { before: [], inside: children, after: [] }
      : withEdgesOut(tidyInside(children));
  if (inside.length === 0) return [...before, ...after];
  const node = link
    ? { type: 'link', url: mark.attrs['href'] as string, children: tidyWords(inside) }
    : { type: mark.type.name, children: tidyInside(inside) };
  return [...before, node as Marked, ...after];
}

function nested(leaves: readonly Leaf[]): PhrasingContent[] {
  const out: PhrasingContent[] = [];
  for (let i = 0; i < leaves.length;) {
    const leaf = leaves[i];
    if (!leaf) break;
    const lengths = leaf.marks.map((mark) => {
      const end = leaves.findIndex((other, n) => n > i && !mark.isInSet(other.marks));
      return { mark, length: (end < 0 ? leaves.length : end) - i };
    });
    const [outer] = lengths.sort(
      (a, b) => b.length - a.length || (a.mark.attrs['span'] as number) - (b.mark.attrs['span'] as number),
    );
    if (!outer) {
      out.push(leaf.node);
      i += 1;
      continue;
    }
    const inside = leaves.slice(i, i + outer.length);
    out.push(
      ...wrapped(
        outer.mark,
        nested(inside.map(({ node, marks }) => ({ node, marks: marks.filter((mark) => !mark.eq(outer.mark)) }))),
      ),
    );
    i += outer.length;
  }
  return out;
}

/** The words of a paragraph, cell or hold point as a tidied tree. */
export function wordsOf(parent: Node): PhrasingContent[] {
  const leaves: Leaf[] = [];
  parent.forEach((node) => leaves.push(...leafOf(node)));
  return tidyWords(nested(joinedMarks(leaves)));
}
