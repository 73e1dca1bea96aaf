import type { Root, RootContent } from 'mdast';
import { EMPTY_HOLD, readBody } from '../../procedure/body';
import { sizeProblem, textProblem, treeProblem } from '../../procedure/bounds';
import { readMarkdown } from '../../procedure/markdown';
import { problem, START } from '../../procedure/problems';
import { splitLines } from '../../procedure/source';
import { syntaxProblem } from '../../procedure/syntaxProblem';
import type { SourceProblem } from '../../procedure/types';
import type { Where } from './schema';

export type ReadWords = { ok: true; nodes: RootContent[] } | { ok: false; problem: SourceProblem };

/** A sheet's body with the words where they stand in it, and the lines ahead of them. */
const around: Record<Where, (text: string) => { source: string; ahead: number }> = {
  // The blank line keeps a first line of hyphens from being taken for a front matter.
  step: (text) => ({ source: `\n<Step id="x" title="x">\n${text}\n</Step>\n`, ahead: 2 }),
  intro: (text) => ({ source: `\n${text}\n\n<Step id="x" title="x">\n</Step>\n`, ahead: 1 }),
};

/**
 * The words of one step, or of the introduction, as the parser of sheets reads them; keys are not looked up. A hold
 * point that is still empty is read too. Fails with the first problem, its line counted from the words' own first.
 */
export function readWords(text: string, where: Where): ReadWords {
  const { source, ahead } = around[where](text);
  const failed = (found: SourceProblem): ReadWords => ({
    ok: false,
    problem: { ...found, line: Math.max(1, found.line - ahead) },
  });
  const lines = splitLines(source);
  const bound = sizeProblem(source) ?? textProblem(lines);
  if (bound) return failed(bound);
  let root: Root;
  try {
    root = readMarkdown(source);
  } catch (thrown) {
    return failed(syntaxProblem(thrown, lines));
  }
  const tangled = treeProblem(root);
  if (tangled) return failed(tangled);
  const { intro, steps, problems } = readBody(root, null);
  const [first] = problems.filter(({ message }) => message !== EMPTY_HOLD);
  if (first) return failed(first);
  const [step, ...more] = steps;
  if (!step || more.length || (where === 'step' && intro.length))
    return failed(problem(START, 'Another step begins among these words.'));
  if (step.cautions.length)
    return failed(problem(START, 'A caution stands among these words. Put it ahead of the step.'));
  return { ok: true, nodes: where === 'step' ? step.children : intro };
}
