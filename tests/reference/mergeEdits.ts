import type { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';

/** Edits as people make them, drawn from a seed, for texts that are merged. */

export interface Chance {
  /** A whole number from 0 to below `n`. */
  below: (n: number) => number;
}

/** A small generator of chance with a period of 2^32 (constants of Numerical Recipes, from memory). */
export function chanceOf(seed: number): Chance {
  let state = (seed * 2654435761) >>> 0;
  return {
    below: (n) => {
      state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
      return Math.floor((state / 2 ** 32) * n);
    },
  };
}

const one = <T>(list: readonly T[], { below }: Chance): T | undefined => list[below(list.length)];
const copy = (p: Procedure): Procedure => structuredClone(p);

type Edit = (p: Procedure, chance: Chance, who: string) => void;

const noteOn =
  (list: 'torques' | 'limits' | 'parts' | 'tools'): Edit =>
  (p, chance, who) => {
    const entry = one(p.frontmatter[list] as { note?: string }[], chance);
    if (entry) entry.note = `Noted by ${who}`;
  };
const nameOn =
  (list: 'torques' | 'limits' | 'parts' | 'tools' | 'timers'): Edit =>
  (p, chance, who) => {
    const entry = one(p.frontmatter[list] as { name: string }[], chance);
    if (entry) entry.name = `${entry.name}, ${who}`;
  };

const EDITS: Edit[] = [
  (p, _, who) => void (p.frontmatter.title = `${p.frontmatter.title}, ${who}`),
  (p, _, who) => void (p.frontmatter.summary = `${p.frontmatter.summary} Also ${who}.`),
  (p, { below }) => void (p.frontmatter.minutes += 1 + below(3)),
  (p, chance) => {
    const torque = one(p.frontmatter.torques, chance);
    if (torque) torque.nm += 1 + chance.below(2);
  },
  noteOn('torques'),
  nameOn('torques'),
  (p, chance) => {
    const limit = one(p.frontmatter.limits, chance);
    if (limit?.max !== undefined) limit.max += 1;
  },
  noteOn('limits'),
  (p, chance, who) => {
    const caution = one(p.frontmatter.cautions, chance);
    if (caution) caution.avoid = `${caution.avoid} Says ${who}.`;
  },
  (p, chance) => {
    const part = one(p.frontmatter.parts, chance);
    if (part) part.quantity += 1;
  },
  noteOn('parts'),
  nameOn('tools'),
  nameOn('timers'),
  (p, chance, who) => {
    if (p.frontmatter.tools.some(({ key }) => key === `tool-of-${who}`)) return;
    const at = chance.below(p.frontmatter.tools.length + 1);
    p.frontmatter.tools.splice(at, 0, { key: `tool-of-${who}`, name: `Tool of ${who}` });
  },
  (p, chance) => {
    if (p.frontmatter.tools.length > 1) p.frontmatter.tools.splice(chance.below(p.frontmatter.tools.length), 1);
  },
  (p, chance) => {
    const unused = <L extends 'torques' | 'limits' | 'timers'>(list: L) =>
      (p.frontmatter[list] as { key: string }[]).filter(({ key }) => !p.steps.some((s) => s.body.includes(`"${key}"`)));
    const gone = one(unused('torques'), chance) ?? one(unused('limits'), chance) ?? one(unused('timers'), chance);
    for (const list of ['torques', 'limits', 'timers'] as const)
      (p.frontmatter[list] as Frontmatter['timers']) = (p.frontmatter[list] as Frontmatter['timers']).filter(
        (e) => e !== gone,
      );
  },
  (p, chance, who) => {
    const step = one(p.steps, chance);
    if (step) step.title = `${step.title}, ${who}`;
  },
  ...Array.from({ length: 3 }, (): Edit => (p, chance, who) => {
    const step = one(p.steps, chance);
    if (!step) return;
    const paragraphs = step.body.split('\n\n');
    const i = chance.below(paragraphs.length);
    if (!paragraphs[i]?.startsWith('<')) paragraphs[i] = `${paragraphs[i] ?? ''} So says ${who}.`.trim();
    step.body = paragraphs.join('\n\n');
  }),
  (p, chance, who) => {
    const step = one(p.steps, chance);
    if (step) step.body = `${step.body}\n\nA paragraph more by ${who}.`.trim();
  },
  (p, chance, who) => {
    const step = one(p.steps, chance);
    const torque = one(p.frontmatter.torques, chance);
    if (step && torque) step.body = `${step.body}\n\nFor ${who}, go to <Torque of="${torque.key}" />.`.trim();
  },
  (p, chance, who) => {
    if (p.steps.some(({ id }) => id === `step-of-${who}`)) return;
    const step = { id: `step-of-${who}`, title: `Step of ${who}`, cautions: [], body: `Written by ${who}.` };
    p.steps.splice(chance.below(p.steps.length + 1), 0, step);
  },
  (p, chance) => {
    if (p.steps.length > 2) p.steps.splice(chance.below(p.steps.length), 1);
  },
  (p, chance) => {
    const [step] = p.steps.splice(chance.below(p.steps.length), 1);
    if (step) p.steps.splice(chance.below(p.steps.length + 1), 0, step);
  },
  (p, _, who) => void (p.intro = `${p.intro}\n\nAn introduction by ${who}.`.trim()),
];

/** A procedure with one to six edits by somebody. */
export function edited(base: Procedure, chance: Chance, who: string): Procedure {
  const p = copy(base);
  for (let n = 1 + chance.below(6); n > 0; n -= 1) one(EDITS, chance)?.(p, chance, who);
  return p;
}
