import type { Image, Nodes, Parent, PhrasingContent, RootContent } from 'mdast';

/** What a reader of another format met that a sheet does not have. */
export interface Foreign {
  what: string;
  quote: string;
  /** What it becomes; null where nothing of it stays. */
  became: string | null;
}

declare module 'mdast' {
  interface ImageData {
    foreign?: Foreign;
  }
}

/** It travels as a picture, which every tool lets stand among words, until its place in the sheet is known. */
export const foreignNode = (what: string, quote: string, became: string | null = null): Image => ({
  type: 'image',
  url: '',
  data: { foreign: { what, quote: tidy(quote), became } },
});

/** One line of words. */
export const tidy = (text: string): string => text.replace(/[\s\u00a0]+/g, ' ').trim();

/** The plain words of a node, as they stand; blocks one after the other. */
export function wordsOf(node: Nodes | readonly Nodes[]): string {
  if (Array.isArray(node)) return (node as Nodes[]).map(wordsOf).join('');
  const one = node as Nodes;
  switch (one.type) {
    case 'text':
    case 'inlineCode':
      return one.value;
    case 'code':
    case 'html':
      return `${one.value}\n`;
    case 'break':
      return ' ';
    default: {
      if (!('children' in one)) return '';
      const inside = (one as Parent).children.map((child) => wordsOf(child as Nodes)).join('');
      return isPhrasing(one) ? inside : `${inside}\n`;
    }
  }
}

const PHRASING = ['emphasis', 'strong', 'delete', 'link', 'linkReference'];
const isPhrasing = (node: Nodes) => PHRASING.includes(node.type);

export const textNode = (value: string): PhrasingContent => ({ type: 'text', value });
export const paragraphOf = (...children: PhrasingContent[]): RootContent => ({ type: 'paragraph', children });

/** Words of a sentence cut in two at a place of its plain text; emphasis and links that reach over it are in both. */
export function splitAt(nodes: readonly PhrasingContent[], at: number): [PhrasingContent[], PhrasingContent[]] {
  const before: PhrasingContent[] = [];
  const after: PhrasingContent[] = [];
  let passed = 0;
  for (const node of nodes) {
    const length = wordsOf(node).length;
    const here = at - passed;
    passed += length;
    if (here > 0 && here >= length) before.push(node);
    else if (here <= 0) after.push(node);
    else if (node.type === 'text' || node.type === 'inlineCode') {
      before.push({ ...node, value: node.value.slice(0, here) });
      after.push({ ...node, value: node.value.slice(here) });
    } else if ('children' in node) {
      const [left, right] = splitAt(node.children as PhrasingContent[], here);
      before.push({ ...node, children: left } as PhrasingContent);
      after.push({ ...node, children: right } as PhrasingContent);
    } else after.push(node);
  }
  return [before, after];
}
