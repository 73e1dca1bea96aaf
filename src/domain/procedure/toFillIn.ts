import type { Nodes } from 'mdast';
import type { DraftBody } from './body';
import { problem, type PlaceOf } from './problems';
import type { Frontmatter } from './schema';
import type { SourceProblem } from './types';
import { ENGINE_TO_FILL_IN, FILL_IN } from './fillIn';

/** What a reading leaves for the search. */
interface Read {
  frontmatter: Frontmatter;
  placeOf: PlaceOf;
  body: DraftBody;
}

/** From the marker to the end of its sentence, short enough to stand in a message. */
const asked = (text: string): string => {
  const from = text.slice(text.indexOf(FILL_IN) + FILL_IN.length).trim();
  const sentence = /^.*?[.?](?=\s|$)/.exec(from)?.[0] ?? from;
  return sentence.length > 100 ? `${sentence.slice(0, 99).trimEnd()}…` : sentence;
};

const found = (text: string): string | null =>
  text.includes(FILL_IN) ? `Still to fill in: ${asked(text) || 'this place'}` : null;

function inHead(value: unknown, path: (string | number)[], placeOf: PlaceOf): SourceProblem[] {
  if (typeof value === 'string') {
    const message = found(value);
    return message ? [problem(placeOf(path), message, path.join('.'))] : [];
  }
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([name, inside]) =>
    inHead(inside, [...path, Array.isArray(value) ? Number(name) : name], placeOf),
  );
}

function inWords(nodes: readonly Nodes[], path: string): SourceProblem[] {
  return nodes.flatMap((node): SourceProblem[] => {
    if (node.type === 'text' || node.type === 'inlineCode') {
      const message = found(node.value);
      return message ? [problem(node.position?.start, message, path)] : [];
    }
    return 'children' in node ? inWords(node.children, path) : [];
  });
}

/**
 * Every place of a text that still holds the marker of a template, an import or the empty sheet. Such a text is kept
 * and shown like any other, but it is not sent in: what nobody filled in is not to work from.
 */
export function toFillIn({ frontmatter, placeOf, body }: Read): SourceProblem[] {
  const engine = frontmatter.engines.indexOf(ENGINE_TO_FILL_IN);
  return [
    ...(engine < 0
      ? []
      : [problem(placeOf(['engines', engine]), 'Still to fill in: which engines it is for.', 'engines')]),
    ...inHead(frontmatter, [], placeOf),
    ...inWords(body.intro, 'intro'),
    ...body.steps.flatMap((step, i) => {
      const title = found(step.title);
      return [
        ...(title ? [problem(step.place, title, `steps.${i}.title`)] : []),
        ...inWords(step.children, `steps.${i}.body`),
      ];
    }),
  ];
}
