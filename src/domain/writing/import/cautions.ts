import type { Paragraph, Parent, PhrasingContent, RootContent } from 'mdast';
import type { Caution } from '../../procedure/schema';
import { splitAt, textNode, wordsOf } from './nodes';

/** A caution as it stands in a text: its signal word, and the words behind it with their links and pictures. */
export interface FoundCaution {
  signal: Caution['signal'];
  words: PhrasingContent[];
  /** Nothing but cautions stands behind it in its step, so it may be meant for the next one. */
  trailing: boolean;
}

const WORD = '(danger|warning|caution|notice)';
/** "Warning:", "WARNING -"; in capitals also "WARNING Hot oil". Only where a sentence begins. */
const SIGNAL = new RegExp(String.raw`(^|[.!?]["”’)]*\s+)${WORD}(\s*[:!–—]\s*|\s+-\s+|\.\s+|$)`, 'gi');
const CAPITALS = /(^|[.!?]["”’)]*\s+)(DANGER|WARNING|CAUTION|NOTICE)(\s+)(?=["“]?\p{Lu})/gu;
const ALONE = new RegExp(String.raw`^\s*${WORD}\s*[:!.–—-]*\s*$`, 'i');

/** Up to the sign that ends it, where another sentence follows. */
const FIRST_SENTENCE = /^[\s\S]*?[.!?]["”’)]*(?=\s+["“‘(]?[\p{Lu}\p{N}])/u;

const signalOf = (text: string) =>
  text
    .trim()
    .toUpperCase()
    .match(/[A-Z]+/)?.[0] as Caution['signal'];

/** The signal word that these words are and nothing else, or null. */
export const signalAlone = (text: string): Caution['signal'] | null => (ALONE.test(text) ? signalOf(text) : null);

interface Place {
  start: number;
  /** Where the words behind the signal word and its colon begin. */
  from: number;
  signal: Caution['signal'];
}

/** A signal word in bold in front of a paragraph needs no colon. */
function boldSignal({ children }: Paragraph): Place | null {
  const [first] = children;
  if (first?.type !== 'strong') return null;
  const text = wordsOf(first);
  const signal = signalAlone(text);
  return signal ? { start: 0, from: text.length, signal } : null;
}

function signalsIn(paragraph: Paragraph): Place[] {
  const text = wordsOf(paragraph.children);
  const bold = boldSignal(paragraph);
  const places = [SIGNAL, CAPITALS].flatMap((pattern) =>
    [...text.matchAll(pattern)].map((match): Place => {
      const [whole, before = '', word = ''] = match;
      return { start: match.index + before.length, from: match.index + whole.length, signal: signalOf(word) };
    }),
  );
  const all = [...(bold ? [bold] : []), ...places].sort((a, b) => a.start - b.start);
  return all.filter((place, i) => i === 0 || place.start > (all[i - 1]?.start ?? -1));
}

/** What stands behind the first `length` letters, and the pictures and marks among them, which are no letters. */
function withoutWords(nodes: readonly PhrasingContent[], length: number): PhrasingContent[] {
  const [cut, rest] = splitAt(nodes, length);
  return [...cut.filter((node) => wordsOf(node) === ''), ...rest];
}

/** Whether a paragraph opens with a signal word, so that its first sentence says no work. */
export const opensWithSignal = (paragraph: Paragraph): boolean => signalsIn(paragraph)[0]?.start === 0;

/** Words without the blanks in front, which would hide a signal word behind them. */
export const withoutBlanks = (nodes: PhrasingContent[]): PhrasingContent[] => {
  const blanks = /^\s*/.exec(wordsOf(nodes))?.[0].length ?? 0;
  return blanks ? withoutWords(nodes, blanks) : nodes;
};

/** Leading blanks and the sign between a bold signal word and its words. */
function withoutLead(nodes: PhrasingContent[]): PhrasingContent[] {
  const lead = /^[\s:!.–—-]*/.exec(wordsOf(nodes))?.[0].length ?? 0;
  return lead ? withoutWords(nodes, lead) : nodes;
}

/**
 * A paragraph without its cautions. One that begins with a signal word is a caution as a whole; in the middle of a
 * paragraph one sentence is, since what follows it may be the work again.
 */
function fromParagraph(paragraph: Paragraph): { left: PhrasingContent[]; found: Omit<FoundCaution, 'trailing'>[] } {
  const places = signalsIn(paragraph);
  const left: PhrasingContent[] = [];
  const found: Omit<FoundCaution, 'trailing'>[] = [];
  let nodes = paragraph.children;
  let cut = 0;
  places.forEach((place, i) => {
    const [before, behind] = splitAt(nodes, place.start - cut);
    left.push(...before);
    const words = withoutWords(behind, place.from - place.start);
    const end = (places[i + 1]?.start ?? Infinity) - place.from;
    const text = wordsOf(words).slice(0, end);
    const length = places[0]?.start === 0 ? text.length : (FIRST_SENTENCE.exec(text)?.[0].length ?? text.length);
    const [own, rest] = splitAt(words, length);
    found.push({ signal: place.signal, words: withoutLead(own) });
    nodes = rest;
    cut = place.from + length;
  });
  return { left: [...left, ...nodes], found };
}

const isBlank = (nodes: readonly PhrasingContent[]) =>
  wordsOf(nodes).trim() === '' && nodes.every(({ type }) => ['text', 'break', 'emphasis', 'strong'].includes(type));

/** Takes the cautions out of blocks, also out of points of lists and quotations; what is then empty goes. */
export function takeCautions(blocks: readonly RootContent[]): { blocks: RootContent[]; cautions: FoundCaution[] } {
  const cautions: FoundCaution[] = [];
  const walk = (nodes: readonly RootContent[]): RootContent[] =>
    nodes.flatMap((node): RootContent[] => {
      if (node.type === 'paragraph') {
        const { left, found } = fromParagraph(node);
        if (found.length === 0) {
          cautions.forEach((caution) => (caution.trailing = false));
          return [node];
        }
        if (!isBlank(left)) cautions.forEach((caution) => (caution.trailing = false));
        cautions.push(...found.map((one) => ({ ...one, trailing: true })));
        return isBlank(left) ? [] : [{ ...node, children: left }];
      }
      if (node.type === 'list' || node.type === 'listItem' || node.type === 'blockquote') {
        const children = walk((node as Parent).children as RootContent[]);
        return children.length ? [{ ...node, children } as RootContent] : [];
      }
      cautions.forEach((caution) => (caution.trailing = false));
      return [node];
    });
  return { blocks: walk(blocks), cautions };
}

/** Whether a block is a caution and nothing else. */
export function isCaution(node: RootContent): boolean {
  const { blocks, cautions } = takeCautions([node]);
  return cautions.length > 0 && blocks.length === 0;
}

/** A signal word that stands alone, as a heading or a line of its own, goes in front of the next paragraph. */
export function joinSignals(blocks: readonly RootContent[]): RootContent[] {
  const out: RootContent[] = [];
  let waiting: Caution['signal'] | null = null;
  for (const node of blocks) {
    const alone = node.type === 'heading' || node.type === 'paragraph' ? signalAlone(wordsOf(node)) : null;
    if (waiting !== null && node.type === 'paragraph' && alone === null) {
      out.push({ ...node, children: [textNode(`${waiting}: `), ...node.children] });
      waiting = null;
    } else {
      if (waiting !== null) out.push({ type: 'paragraph', children: [textNode(`${waiting}:`)] });
      waiting = alone;
      if (alone === null) out.push(node);
    }
  }
  if (waiting !== null) out.push({ type: 'paragraph', children: [textNode(`${waiting}:`)] });
  return out;
}
