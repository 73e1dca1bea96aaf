import type { ListItem, Paragraph, RootContent } from 'mdast';
import { foreignNode, paragraphOf, splitAt, wordsOf } from './nodes';

/** "1. ", "2) ": a number that was typed in front of a paragraph instead of being made by a list. */
const TYPED = /^\s*(\d{1,3})[.)][\s\u00a0]+(?=\S)/;

interface Numbered {
  at: number;
  number: number;
  length: number;
}

/** Runs of paragraphs that count up from 1 by one, at least two of them, whatever stands between. */
function runsIn(blocks: readonly RootContent[]): Set<Numbered> {
  const kept = new Set<Numbered>();
  let run: Numbered[] = [];
  const close = () => {
    if (run.length > 1) run.forEach((one) => kept.add(one));
    run = [];
  };
  blocks.forEach((node, at) => {
    const found = node.type === 'paragraph' ? TYPED.exec(wordsOf(node.children)) : null;
    if (node.type === 'heading') close();
    if (!found) return;
    const number = Number(found[1]);
    if (number !== run.length + 1) close();
    if (number === run.length + 1) run.push({ at, number, length: found[0].length });
  });
  close();
  return kept;
}

/** Paragraphs that were numbered by hand as the numbered list that they are meant to be. The numbers are told. */
export function typedNumbers(blocks: readonly RootContent[]): RootContent[] {
  const numbered = new Map([...runsIn(blocks)].map((one) => [one.at, one]));
  const out: RootContent[] = [];
  blocks.forEach((node, at) => {
    const one = numbered.get(at);
    if (!one) {
      out.push(node);
      return;
    }
    const [, words] = splitAt((node as Paragraph).children, one.length);
    const told = foreignNode('Number typed by hand', String(one.number), 'the number that the list gives it');
    const item: ListItem = { type: 'listItem', spread: false, children: [paragraphOf(...words, told) as Paragraph] };
    const last = out.at(-1);
    if (one.number > 1 && numbered.has(at - 1) && last?.type === 'list') last.children.push(item);
    else out.push({ type: 'list', ordered: true, start: one.number, spread: false, children: [item] });
  });
  return out;
}
