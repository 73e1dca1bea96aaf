import type { Element, ElementContent } from 'hast';
import type { Mark, Node, Schema } from 'prosemirror-model';
import { withoutForbidden } from '../../procedure/characters';
import { linkFault } from '../../procedure/links';
import { markOf, typeOf } from '../field/schema';
import type { LeftOut } from './leftOut';
import { attributeOf, boldOf, isHidden, isStruck, italicOf, plainOf, shiftOf } from './style';

/** What a stretch of pasted words is set as. */
export interface Setting {
  strong: boolean;
  /** Its weight is settled by where it stands, as in a heading, whatever the words in it say. */
  settled: boolean;
  emphasis: boolean;
  code: boolean;
  href: string | null;
}

export const PLAIN: Setting = { strong: false, settled: false, emphasis: false, code: false, href: null };

/** The setting of what stands inside an element. */
export const settingIn = (node: Element, setting: Setting): Setting => ({
  ...setting,
  strong: setting.settled ? setting.strong : (boldOf(node) ?? setting.strong),
  emphasis: italicOf(node) ?? setting.emphasis,
});

/** Words, or a line break, on the way into a field. */
type Kept = { text: string; setting: Setting } | 'break';
/** Also the place of something that was left out, which must not join the figures on its two sides. */
export type Leaf = Kept | 'gap';

/** Elements that bring no words: programs, forms, and what a word processor keeps for itself. */
const SILENT =
  /^(script|style|head|meta|link|title|template|noscript|svg|math|iframe|object|embed|canvas|select|textarea|input|button|xml|o:p|[vw]:.*)$/;
/** Those of them that a reader saw between the words. */
const SEEN = /^(svg|math|iframe|object|embed|canvas|select|textarea|input|button)$/;
const SET_AS_CODE = ['code', 'kbd', 'samp', 'tt'];

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻';
const LOWERED = '₀₁₂₃₄₅₆₇₈₉₊₋';
const withSigns = (text: string, signs: string) =>
  text.replace(/[\d+\-−]/g, (sign) => [...signs]['0123456789+-'.indexOf(sign.replace('−', '-'))] ?? sign);

/**
 * "10²" must not come in as "102". Where there is no sign for all of it, as in 10 to the power of 2.5, a "^" or a blank
 * keeps the figures apart; words without figures, and marks of notes in brackets, stand as they are.
 */
function shifted(leaves: readonly Leaf[], shift: 'sup' | 'sub', setting: Setting): Leaf[] {
  const whole = leaves.map((leaf) => (typeof leaf === 'string' ? ' ' : leaf.text)).join('');
  if (/^[\d+\-−\s]+$/.test(whole)) {
    const signs = shift === 'sup' ? RAISED : LOWERED;
    return leaves.map((leaf) => (typeof leaf === 'string' ? leaf : { ...leaf, text: withSigns(leaf.text, signs) }));
  }
  if (!/\d/.test(whole) || /^\s*\[[^\]]*\]\s*$/.test(whole)) return [...leaves];
  return [{ text: shift === 'sup' ? '^' : ' ', setting }, ...leaves, 'gap'];
}

const FIGURE_FIRST = /^\p{N}/u;
const FIGURE_LAST = /\p{N}$/u;
/** Puts a blank where something was left out between two figures, and nothing where it was not. */
export function gapsClosed(leaves: readonly Leaf[]): Kept[] {
  const out: Kept[] = [];
  let gap = false;
  for (const leaf of leaves) {
    if (leaf === 'gap') {
      gap = true;
      continue;
    }
    const last = out.at(-1);
    const joins =
      gap &&
      leaf !== 'break' &&
      last &&
      last !== 'break' &&
      FIGURE_LAST.test(last.text) &&
      FIGURE_FIRST.test(leaf.text);
    if (joins) out.push({ text: ' ', setting: PLAIN });
    out.push(leaf);
    gap = false;
  }
  return out;
}

/** Words of inline elements in reading order; pictures, links that may not stand and struck words go to `left`. */
export function leavesOf(nodes: readonly ElementContent[], setting: Setting, left: LeftOut): Leaf[] {
  return nodes.flatMap((node): Leaf[] => {
    if (node.type === 'text') {
      const text = withoutForbidden(node.value.replace(/[\u200b\u00ad]/g, ''));
      return text ? [{ text, setting }] : [];
    }
    if (node.type !== 'element' || isHidden(node)) return [];
    const { tagName } = node;
    if (tagName === 'math') left.formulas.push(plainOf(node.children).replace(/\s+/g, ' ').trim());
    if (SILENT.test(tagName)) return SEEN.test(tagName) ? ['gap'] : [];
    if (tagName === 'br') return ['break'];
    if (tagName === 'img' || tagName === 'picture' || tagName === 'video') {
      left.pictures.push(attributeOf(node, 'alt').trim());
      return ['gap'];
    }
    if (isStruck(node)) {
      const words = plainOf(node.children).trim();
      if (words) left.struck.push(words);
      return words ? ['gap'] : [];
    }
    const inside = settingIn(node, setting);
    if (SET_AS_CODE.includes(tagName)) inside.code = true;
    if (tagName === 'a') {
      const href = attributeOf(node, 'href');
      if (href && linkFault(href) === null) inside.href = href;
      else if (href && !href.startsWith('#')) left.links.push(plainOf(node.children).trim());
    }
    const leaves = leavesOf(node.children, inside, left);
    const shift = shiftOf(node);
    return shift ? shifted(leaves, shift, inside) : leaves;
  });
}

/** Runs of blanks become one; a fixed blank stays between two signs, where it holds a number and its unit together. */
function tidied(leaves: readonly Kept[]): Kept[] {
  const out: Kept[] = [];
  let after = ' ';
  for (const leaf of leaves) {
    if (leaf === 'break') {
      out.push(leaf);
      after = ' ';
      continue;
    }
    let text = leaf.text.replace(/[\s\u00a0]*[ \t\r\n\f][\s\u00a0]*|\u00a0{2,}/g, ' ');
    if (/\s$/.test(after)) text = text.replace(/^\s+/, '');
    if (!text) continue;
    out.push({ ...leaf, text });
    after = text;
  }
  return out;
}

/** Pasted words as a field's nodes: trimmed, without a break at an edge. */
export function nodesOf(given: readonly Leaf[], schema: Schema, breaks = true): Node[] {
  const closed = gapsClosed(given);
  const leaves = tidied(
    breaks ? closed : closed.map((leaf) => (leaf === 'break' ? { text: ' ', setting: PLAIN } : leaf)),
  );
  while (leaves[0] === 'break') leaves.shift();
  while (leaves.at(-1) === 'break') leaves.pop();
  return leaves.flatMap((leaf, i): Node[] => {
    if (leaf === 'break') return [typeOf(schema, 'hard_break').create()];
    const { setting } = leaf;
    const last = i === leaves.length - 1 || leaves[i + 1] === 'break';
    const text = last ? leaf.text.trimEnd() : leaf.text;
    if (!text) return [];
    const names = (['emphasis', 'strong', 'code'] as const).filter((name) => setting[name]);
    let marks: readonly Mark[] = [];
    for (const name of names) marks = markOf(schema, name).create().addToSet(marks);
    if (setting.href !== null) marks = markOf(schema, 'link').create({ href: setting.href }).addToSet(marks);
    return [schema.text(text, marks)];
  });
}
