import type { Nodes, PhrasingContent, RootContent } from 'mdast';
import { isElement, type Element } from './attributes';
import { limitKeysIn } from './bindings';
import { isStage, type Attributes } from './components';
import type { BothUnits } from '../measure/format';
import type { Frontmatter } from './schema';
import type { Reference } from './types';
import { limitText, partText, stageText, timerText, torqueText } from './values';

/** Attributes of a cleaned element: literal text, by name. */
export function given(element: Element): Attributes {
  return Object.fromEntries(
    element.attributes.flatMap((a) =>
      a.type === 'mdxJsxAttribute' && typeof a.value === 'string' ? [[a.name, a.value]] : [],
    ),
  );
}

/** What a cleaned element points at, or null for one that points at nothing. */
export function referenceOf(element: Element): Reference | null {
  const { of: key = '', pass, stage, kind = '' } = given(element);
  switch (element.name) {
    case 'Torque':
      return pass === undefined ? { kind: 'torque', key } : { kind: 'torque', key, pass: Number(pass) };
    case 'Timer':
      return isStage(stage) ? { kind: 'timer', key, stage } : { kind: 'timer', key };
    case 'Limit':
      return { kind: 'limit', key };
    case 'Part':
      return { kind: 'part', key };
    case 'Figure':
      return { kind: 'figure', key };
    case 'Worksheet':
      return { kind: 'worksheet', worksheet: kind, keys: limitKeysIn(given(element)['of']) };
    default:
      return null;
  }
}

/** Every element of cleaned nodes, in reading order. The depth is bounded before. */
export function elementsIn(nodes: readonly Nodes[]): Element[] {
  return nodes.flatMap((node) => [
    ...(isElement(node) ? [node] : []),
    ...('children' in node ? elementsIn(node.children) : []),
  ]);
}

/** What stands in the margin of a step: each value once, in the order first used. */
export function referencesIn(nodes: readonly RootContent[]): Reference[] {
  const found = new Map<string, Reference>();
  for (const element of elementsIn(nodes)) {
    const reference = referenceOf(element);
    if (reference) {
      const same = JSON.stringify(reference);
      if (!found.has(same)) found.set(same, reference);
    }
  }
  return [...found.values()];
}

/** Whether a component opens a sentence: nothing but space or the end of another sentence stands before it. */
export function startsSentence(siblings: readonly PhrasingContent[], index: number): boolean {
  const before = siblings[index - 1];
  if (before === undefined) return true;
  return (
    before.type === 'text' && /(^|[.!?:])\s*$/.test(before.value) && (index === 1 ? true : before.value.trim() !== '')
  );
}

/** The text that a value stands for, in both unit systems; null where it is not a value of a sentence. */
export function valueOf(reference: Reference, head: Frontmatter, opens: boolean): BothUnits | null {
  const one = <T extends { key: string }>(entries: readonly T[]) =>
    entries.find((e) => 'key' in reference && e.key === reference.key);
  switch (reference.kind) {
    case 'torque': {
      const torque = one(head.torques);
      return torque ? torqueText(torque, { pass: reference.pass }) : null;
    }
    case 'limit': {
      const limit = one(head.limits);
      return limit ? limitText(limit) : null;
    }
    case 'part': {
      const part = one(head.parts);
      if (!part) return null;
      const text = partText(part, head.parts, opens);
      return { metric: text, inch: text };
    }
    case 'timer': {
      if (reference.stage) {
        const supply = one(head.supplies);
        return supply ? stageText(supply, reference.stage) : null;
      }
      const timer = one(head.timers);
      return timer ? timerText(timer) : null;
    }
    default:
      return null;
  }
}
