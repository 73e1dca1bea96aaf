import type { Root, RootContent } from 'mdast';
import type { MdxJsxFlowElement, MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import { componentOf } from './components';
import { gathered, lifted } from './arrange';
import { cleanElement, elementNode, paragraph, passage, report, words, type Checking } from './passage';
import { tidyWords } from './phrasing';
import { START, type Place } from './problems';
import { isModuleLine, MODULE_REFUSAL } from './refusals';
import { Key, type Frontmatter } from './schema';
import type { SourceProblem } from './types';

/** A step as read: checked and cleaned, cautions taken out of the prose, places kept for reports. */
export interface DraftStep {
  id: string;
  title: string;
  cautions: string[];
  children: RootContent[];
  place: Place;
}

export interface DraftBody {
  intro: RootContent[];
  steps: DraftStep[];
  problems: SourceProblem[];
}

const MOST_STEPS = 200;
const LONGEST_TITLE = 90;

export const EMPTY_HOLD = 'This hold point says nothing. Write what must be checked, and by whom.';

function hold(node: MdxJsxFlowElement, c: Checking): RootContent[] {
  if (!cleanElement(node, c)) return [];
  const [only, ...more] = node.children;
  const start = node.position?.start;
  const held = (children: MdxJsxTextElement['children']): RootContent[] => {
    const element: MdxJsxTextElement = { ...elementNode('mdxJsxTextElement', 'Hold', {}, node), children };
    return [{ type: 'paragraph', children: [element], ...(node.position && { position: node.position }) }];
  };
  const empty = () => {
    report(c, start, EMPTY_HOLD);
    // It stays in the tree, so that whoever is just about to write it keeps it.
    return held([]);
  };
  if (!only) return empty();
  if (more.length || only.type !== 'paragraph')
    return report(c, start, 'A hold point is one sentence or two, without lists, tables or blank lines.') ?? [];
  const children = tidyWords(words(only.children, c));
  return children.length === 0 ? empty() : held(children);
}

function block(node: MdxJsxFlowElement, c: Checking): RootContent[] {
  if (node.name === 'Hold') return hold(node, c);
  const clean = cleanElement(node, c);
  return clean ? [elementNode('mdxJsxFlowElement', clean.name, clean.given, node)] : [];
}

/** Everything in a step or in the introduction but cautions and steps. */
function contents(node: RootContent, c: Checking): RootContent[] {
  if (node.type === 'mdxJsxFlowElement' && componentOf(node.name)?.stands === 'block') return block(node, c);
  if (node.type !== 'paragraph') return passage([node], c);
  const [first] = node.children;
  if (first?.type === 'text' && isModuleLine(first.value)) return report(c, node.position?.start, MODULE_REFUSAL) ?? [];
  return paragraph(node, c);
}

const isNamed = <N extends string>(node: RootContent, ...names: N[]): node is MdxJsxFlowElement & { name: N } =>
  node.type === 'mdxJsxFlowElement' && names.some((name) => name === node.name);

function readStep(
  node: MdxJsxFlowElement,
  index: number,
  ahead: string[],
  head: Frontmatter | null,
  problems: SourceProblem[],
): DraftStep {
  const c: Checking = { head, problems, path: `steps.${index}.body` };
  const place = node.position?.start ?? START;
  const clean = cleanElement({ ...node, children: [] }, { ...c, path: `steps.${index}` });
  const { id = '', title = '' } = clean?.given ?? {};
  if (clean) {
    const wrong = Key.safeParse(id);
    if (!wrong.success)
      report(
        { ...c, path: `steps.${index}.id` },
        place,
        `The id of this step ${wrong.error.issues[0]?.message ?? 'cannot be used'}.`,
      );
    if (title === '' || title.length > LONGEST_TITLE)
      report(
        { ...c, path: `steps.${index}.title` },
        place,
        `The title of this step must be 1 to ${LONGEST_TITLE} characters long; it has ${title.length}.`,
      );
  }
  const cautions = [...ahead];
  const children: RootContent[] = [];
  const inside = gathered(lifted(node.children), c);
  for (const child of inside) {
    const start = child.position?.start;
    if (isNamed(child, 'Step'))
      report(c, start, 'A step stands inside another step. Close the first one with </Step> before it.');
    else if (isNamed(child, 'Caution')) {
      const key = cleanElement(child, { ...c, path: `steps.${index}.cautions` })?.given['of'];
      if (key === undefined) continue;
      if (children.length)
        report(
          c,
          start,
          'A caution stands before what it guards. Move it to the start of the step, or to a step of its own.',
        );
      else if (cautions.includes(key)) report(c, start, `The caution "${key}" stands twice before this step.`);
      else cautions.push(key);
    } else children.push(...contents(child, c));
  }
  return { id, title, cautions, children, place };
}

/** The body of a procedure: introduction, then steps. Every fault is reported, reading goes on behind it. */
export function readBody(root: Root, head: Frontmatter | null): DraftBody {
  const problems: SourceProblem[] = [];
  const intro: RootContent[] = [];
  const steps: DraftStep[] = [];
  let ahead: string[] = [];
  let lastCaution: Place | undefined;
  const nodes = root.children.slice(root.children[0]?.type === 'yaml' ? 1 : 0);
  const top = gathered(lifted(nodes), { problems, path: 'intro' });
  for (const node of top) {
    const c: Checking = { head, problems, path: steps.length ? `steps.${steps.length - 1}.body` : 'intro' };
    const start = node.position?.start;
    if (isNamed(node, 'Step')) {
      steps.push(readStep(node, steps.length, ahead, head, problems));
      ahead = [];
    } else if (isNamed(node, 'Caution')) {
      const key = cleanElement(node, { ...c, path: `steps.${steps.length}.cautions` })?.given['of'];
      if (key !== undefined && ahead.includes(key))
        report(c, start, `The caution "${key}" stands twice before this step.`);
      else if (key !== undefined) ahead.push(key);
      lastCaution = start;
    } else if (steps.length)
      report(c, start, 'Only steps stand after the first step. Move this into the step before or behind it.');
    else if (isNamed(node, 'Hold', 'Worksheet'))
      report(c, start, `${node.name} belongs into a step, not into the introduction.`);
    else intro.push(...contents(node, c));
  }
  const end = root.position?.end;
  if (steps.length === 0)
    report(
      { head, problems, path: 'steps' },
      end,
      'A procedure needs at least one step: <Step id="first" title="What to do">.',
    );
  else if (ahead.length)
    report(
      { head, problems, path: `steps.${steps.length - 1}.cautions` },
      lastCaution,
      'This caution stands after the last step. Move it before the step it guards.',
    );
  if (steps.length > MOST_STEPS)
    report(
      { head, problems, path: 'steps' },
      steps[MOST_STEPS]?.place,
      `A procedure has at most ${MOST_STEPS} steps. Divide it.`,
    );
  steps.forEach((step, i) => {
    const same = steps.findIndex((s) => s.id === step.id);
    if (step.id && same < i)
      report(
        { head, problems, path: `steps.${i}.id` },
        step.place,
        `Step ${same + 1} already has the id "${step.id}". Give this step its own.`,
      );
  });
  return { intro, steps, problems };
}
