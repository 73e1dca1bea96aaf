import type { Heading, ListItem, PhrasingContent, RootContent } from 'mdast';
import { isCaution, opensWithSignal, signalAlone, withoutBlanks } from './cautions';
import { sentencesOf } from './cautionWords';
import { foreignNode, paragraphOf, splitAt, tidy, wordsOf } from './nodes';

export type ListKind = 'parts' | 'tools' | 'supplies';

export interface OutlinedStep {
  /** Words of its title; empty where there were none short enough. */
  title: PhrasingContent[];
  /** Cautions that stand ahead of its title, and so guard this step alone. */
  before: RootContent[];
  blocks: RootContent[];
  /** How many of its blocks stood inside its own numbered point; what was put behind them did not. */
  own: number;
}

export interface Outline {
  title: PhrasingContent[];
  intro: RootContent[];
  steps: OutlinedStep[];
  lists: { kind: ListKind; heading: Heading; blocks: RootContent[] }[];
}

export const LONGEST_TITLE = 90;

/** Only headings that say it plainly: anything else stays prose. */
const LISTS: [RegExp, ListKind][] = [
  [/^(parts|parts (needed|required|list)|list of parts|new parts):?$/i, 'parts'],
  [/^(tools|tools (needed|required)|special tools|list of tools):?$/i, 'tools'],
  [/^(supplies|supplies (needed|required)|consumables):?$/i, 'supplies'],
];
/** A heading that only says that the steps follow. */
const STEPS_FOLLOW = /^(steps?|procedure|instructions?|method|the work|how to do it|what to do):?$/i;

const said = (heading: Heading) => tidy(wordsOf(heading));
const listKind = (heading: Heading) => LISTS.find(([pattern]) => pattern.test(said(heading)))?.[1] ?? null;

/** A point of a numbered list as a step: its first sentence is the title where it is short enough. */
const stepOfItem = ({ children }: ListItem): OutlinedStep => stepOfBlocks(children);

function stepOfBlocks(children: readonly RootContent[]): OutlinedStep {
  const [first, ...others] = children;
  const untitled = { title: [], before: [], blocks: [...children], own: children.length };
  if (first?.type !== 'paragraph') return untitled;
  const text = wordsOf(first.children);
  const [sentence = '', second = ''] = sentencesOf(text);
  const guards = opensWithSignal(first);
  if (!guards && (sentence.length > LONGEST_TITLE || !/[\p{L}\p{N}]/u.test(sentence))) return untitled;
  // "WARNING. Hot oil can burn." says its hazard only in the second sentence.
  const opening = guards && signalAlone(sentence) ? `${sentence} ${second}` : sentence;
  const [cut, behind] = splitAt(first.children, lengthOf(text, opening));
  const rest = withoutBlanks(behind);
  const left = [...(rest.length ? [paragraphOf(...rest)] : []), ...others];
  if (!guards) return { title: cut, before: [], blocks: left, own: left.length };
  // A caution is no title: the work is what follows it.
  const work = stepOfBlocks(left);
  return { ...work, before: [paragraphOf(...cut), ...work.before] };
}

/** How far a tidied sentence reaches in the text that it was taken from. */
function lengthOf(text: string, sentence: string): number {
  let left = sentence.replace(/\s/g, '').length;
  let i = 0;
  for (; i < text.length && left > 0; i += 1) if (!/[\s\u00a0]/.test(text[i] ?? '')) left -= 1;
  return i;
}

function stepOfHeading(heading: Heading): OutlinedStep {
  const text = said(heading);
  if (text !== '' && text.length <= LONGEST_TITLE) return { title: heading.children, before: [], blocks: [], own: 0 };
  return { title: [], before: [], blocks: heading.children.length ? [paragraphOf(...heading.children)] : [], own: 0 };
}

/**
 * Finds title, introduction, steps and plain lists in a how-to. The first heading is the title. Where other headings
 * follow, those of the highest level are the steps; else the points of numbered lists at the top level are.
 */
export function outline(blocks: readonly RootContent[]): Outline {
  const out: Outline = { title: [], intro: [], steps: [], lists: [] };
  const first = blocks.findIndex((node) => node.type === 'heading');
  const rest = blocks.filter((_, i) => i !== first);
  const titleHeading = blocks[first];
  if (titleHeading?.type === 'heading') {
    out.title = titleHeading.children;
    if (said(titleHeading).length > LONGEST_TITLE) out.intro.push(paragraphOf(...titleHeading.children));
  }
  const headings = rest.filter((node): node is Heading => node.type === 'heading');
  const making = headings.filter((heading) => listKind(heading) === null && !STEPS_FOLLOW.test(said(heading)));
  const level = Math.min(...making.map(({ depth }) => depth));
  const byHeading = making.length > 0;
  /** Where blocks go now. */
  let list: Outline['lists'][number] | null = null;
  let numbered = !byHeading;
  const put = (node: RootContent) => (out.steps.at(-1)?.blocks ?? out.intro).push(node);

  for (const [i, node] of rest.entries()) {
    if (node.type === 'heading') {
      const kind = listKind(node);
      list = null;
      if (kind) {
        list = { kind, heading: node, blocks: [] };
        out.lists.push(list);
      } else if (STEPS_FOLLOW.test(said(node)) && numbersFollow(rest.slice(i + 1))) {
        numbered = true;
        put(paragraphOf(foreignNode('Heading', said(node), 'the steps themselves')));
      } else if (node.depth <= level || STEPS_FOLLOW.test(said(node))) {
        numbered = !byHeading;
        out.steps.push(stepOfHeading(node));
      } else put(node);
    } else if (list && list.blocks.length === 0 && (node.type === 'list' || node.type === 'table'))
      list.blocks.push(node);
    else if (numbered && node.type === 'list' && node.ordered === true)
      out.steps.push(...node.children.map(stepOfItem));
    else {
      if (list && list.blocks.length === 0) {
        // The heading promised a list and prose came: it is kept as it stands.
        put({ ...list.heading, depth: 6 });
        out.lists.splice(out.lists.indexOf(list), 1);
      }
      list = null;
      put(node);
    }
  }
  for (const { heading } of out.lists.filter((one) => one.blocks.length === 0)) out.intro.push(heading);
  out.lists = out.lists.filter((one) => one.blocks.length > 0);
  if (!byHeading || numbered) moveTrailing(out.steps);
  return out;
}

const numbersFollow = (blocks: readonly RootContent[]): boolean => {
  const end = blocks.findIndex(({ type }) => type === 'heading');
  return blocks.slice(0, end < 0 ? undefined : end).some((node) => node.type === 'list' && node.ordered === true);
};

/** A caution between two numbered points stands before the second; one inside a point guards that point too and stays. */
function moveTrailing(steps: OutlinedStep[]): void {
  steps.slice(0, -1).forEach(({ blocks, own }, i) => {
    const next = steps[i + 1];
    for (
      let last = blocks.at(-1);
      blocks.length > own && last?.type === 'paragraph' && isCaution(last);
      last = blocks.at(-1)
    ) {
      next?.before.unshift(last);
      blocks.pop();
    }
  });
}
