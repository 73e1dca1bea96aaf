import type { HowTo, HowToStep, WithContext } from 'schema-dts';
import type { Caution, Frontmatter } from '../procedure/schema';
import type { RenderedProcedure, RenderedStep } from '../procedure/types';
import { stepRows } from './dita/valueRows';

export interface HowToFacts {
  number: string;
  letter: string;
  /** ISO 8601. */
  publishedAt: string;
  author: string;
  /** Scheme and host in front of addresses; empty where the page's own is meant. */
  origin: string;
}

const MAKER_FIRST = "The maker's current service information, local rules and licensed practice come first.";

const cautionWords = ({ signal, hazard, harm, avoid }: Caution): string => `${signal}: ${hazard} ${harm}. ${avoid}`;

const cautions = (keys: readonly string[], f: Frontmatter): string[] =>
  f.cautions.filter(({ key }) => keys.includes(key)).map(cautionWords);

/** "Cover bolt: 10 ±1 N·m (89 ±9 lbf·in). M6, dry, 11 places. Demonstration values": no number without its state and origin. */
const values = (one: RenderedStep, f: Frontmatter): string[] =>
  stepRows(one.references, f).map(([name, to, state, origin]) => `${name}: ${to}. ${state} ${origin}`);

// Cautions stand first in the words of the step: a program may show nothing else of it.
const step = (one: RenderedStep, f: Frontmatter, page: string): HowToStep => ({
  '@type': 'HowToStep',
  position: one.number,
  name: one.title,
  text: [...cautions(one.cautions, f), one.text, ...values(one, f), ...one.holds.map((hold) => `Hold point. ${hold}`)]
    .filter(Boolean)
    .join('\n'),
  url: `${page}#step-${one.id}`,
});

/** A sheet as a schema.org HowTo, from the rendering that is kept: for tools of whoever reads or saves the page. */
export function howTo({ frontmatter: f, steps }: RenderedProcedure, facts: HowToFacts): WithContext<HowTo> {
  const page = `${facts.origin}/procedures/${facts.number}/revisions/${facts.letter}`;
  const named = new Set(steps.flatMap((one) => one.cautions));
  const atLarge = f.cautions.filter(({ key }) => !named.has(key)).map(cautionWords);
  return {
    '@context': 'https://schema.org',
    '@type': 'HowTo',
    name: f.title,
    description: [f.summary, ...atLarge, MAKER_FIRST].join(' '),
    identifier: facts.number,
    version: facts.letter,
    dateModified: facts.publishedAt,
    author: { '@type': 'Person', name: facts.author },
    url: page,
    totalTime: `PT${f.minutes}M`,
    tool: f.tools.map(({ name, range }) => ({ '@type': 'HowToTool', name: range ? `${name}, ${range}` : name })),
    supply: [
      ...f.parts.map(({ name, quantity }) => ({ '@type': 'HowToSupply' as const, name, requiredQuantity: quantity })),
      ...f.supplies.map(({ name }) => ({ '@type': 'HowToSupply' as const, name })),
    ],
    step: steps.map((one) => step(one, f, page)),
  };
}

/** JSON that stands inside a script element: nothing in it can end the element or begin a comment. */
export const scriptJson = (value: unknown): string =>
  JSON.stringify(value).replace(/[<>&\u2028\u2029]/g, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`);
