import type { Procedure } from '../procedure/types';
import { mergeFrontmatter } from './mergeEntries';
import { newlyDangling } from './mergeReferences';
import { mergeSteps, mergeWords } from './mergeSteps';
import type { Asking, Choices, Merge, Texts } from './mergeTypes';

function once(texts: Texts, choices: Choices, asked: ReadonlySet<string>): Pick<Merge, 'procedure' | 'conflicts'> {
  const asking: Asking = { choices, conflicts: [] };
  const frontmatter = mergeFrontmatter(asking, texts, asked);
  const { base, mine, theirs } = texts;
  const intros = { base: base.intro, mine: mine.intro, theirs: theirs.intro };
  const intro = mergeWords(asking, 'intro', 'Introduction', intros);
  return { procedure: { frontmatter, intro, steps: mergeSteps(asking, texts) }, conflicts: asking.conflicts };
}

/**
 * Brings a draft and what was published meanwhile together: values by key and field, steps by id, words by lines. What
 * cannot be brought together without asking is a conflict, and until it is answered stands as in the base. Pure, and
 * never throws on anything that has the shape of a procedure.
 *
 * Safer than a merge of lines in three ways: a torque, limit or caution that both sides changed is asked about whole;
 * so is an entry that one side took away and the other points at; and what has a key or id is never there twice.
 *
 * @param base what `mine` was written on
 * @param theirs what is published now
 * @param choices by path; a choice may bring up a further question, so merge again with every one
 */
export function merge(base: Procedure, mine: Procedure, theirs: Procedure, choices: Choices = {}): Merge {
  const texts = { base, mine, theirs };
  const asked = new Set<string>();
  for (;;) {
    const merged = once(texts, choices, asked);
    const fresh = newlyDangling(merged.procedure, mine, theirs).filter((path) => !asked.has(path));
    if (fresh.length === 0) return { texts, ...merged };
    for (const path of fresh) asked.add(path);
  }
}

/** The merged text with each conflict answered; one that has no answer stands as in the base. */
export const resolve = ({ texts: { base, mine, theirs } }: Merge, choices: Choices): Procedure =>
  merge(base, mine, theirs, choices).procedure;
