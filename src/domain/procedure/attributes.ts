import type { MdxJsxFlowElement, MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import { forbiddenCharacter, forbiddenSentence } from './characters';
import type { Attributes, Component } from './components';
import { suggestion } from './nearest';
import { problem, type Place } from './problems';
import type { SourceProblem } from './types';

export type Element = MdxJsxFlowElement | MdxJsxTextElement;

export const isElement = (node: { type: string }): node is Element =>
  node.type === 'mdxJsxFlowElement' || node.type === 'mdxJsxTextElement';

/**
 * Literal attributes of `element`. Anything that is not plain text in quotes is a problem at its
 * place: a bare name, an expression, a spread, an unknown or a repeated name.
 */
export function readAttributes(
  element: Element,
  component: Component,
): { given: Attributes; placeOf: (attribute: string) => Place | undefined; problems: SourceProblem[] } {
  const start = element.position?.start;
  const problems: SourceProblem[] = [];
  const given = new Map<string, string>();
  const places = new Map<string, Place | undefined>();
  const known = Object.keys(component.attributes);
  const add = (place: Place | undefined, message: string) => problems.push(problem(place, message));
  for (const attribute of element.attributes) {
    const place = attribute.position?.start ?? start;
    if (
      attribute.type === 'mdxJsxExpressionAttribute' ||
      (attribute.value !== null && typeof attribute.value === 'object')
    ) {
      add(place, `Curly brackets have no place here. ${element.name} is written ${component.example}.`);
      continue;
    }
    const { name, value } = attribute;
    if (!known.includes(name))
      add(
        place,
        `${element.name} has no attribute "${name}". ${known.length ? suggestion(name, known) : 'It has none.'}`,
      );
    else if (given.has(name)) add(place, `"${name}" is written twice in this ${element.name}.`);
    else if (typeof value !== 'string') add(place, `"${name}" needs a value in quotes: ${component.example}.`);
    else {
      const found = forbiddenCharacter(value);
      if (found) add(place, forbiddenSentence(found.what));
      given.set(name, value.replace(/\s+/g, ' ').trim());
      places.set(name, place);
    }
  }
  for (const name of known)
    if (component.attributes[name] === 'required' && !given.has(name) && problems.length === 0)
      add(start, `${element.name} needs ${name}="…": ${component.example}.`);
  return { given: Object.fromEntries(given), placeOf: (name) => places.get(name) ?? start, problems };
}
