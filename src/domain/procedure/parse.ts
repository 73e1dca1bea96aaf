import type { Root, RootContent } from 'mdast';
import { sizeProblem, textProblem, treeProblem } from './bounds';
import { readBody, type DraftBody } from './body';
import { toSource } from './canonical';
import { readFrontmatter } from './frontmatter';
import { readMarkdown, writeMarkdown } from './markdown';
import { noticesOf } from './notices';
import { inOrder, problem, START, type PlaceOf } from './problems';
import { renderProcedure } from './render';
import type { Frontmatter } from './schema';
import { plainLines, splitLines } from './source';
import { syntaxProblem } from './syntaxProblem';
import { toFillIn } from './toFillIn';
import type { Parsed, Procedure, SourceProblem } from './types';

/** What one reading of a text finds: cleaned trees beside the procedure they are written out to. */
export interface Reading {
  ok: true;
  frontmatter: Frontmatter;
  placeOf: PlaceOf;
  body: DraftBody;
  procedure: Procedure;
}

type Read = Reading | { ok: false; errors: SourceProblem[] };

const failed = (...errors: SourceProblem[]): Read => ({ ok: false, errors: inOrder(errors) });

function read(text: string): Read {
  const source = splitLines(text);
  const bound = textProblem(source);
  if (bound) return failed(bound);
  if (source.headLines === 0)
    return failed(
      problem(
        START,
        'The text must begin with its front matter: a line of three hyphens, the fields, and again a line of three hyphens.',
      ),
    );
  let root: Root;
  try {
    root = readMarkdown(text);
  } catch (thrown) {
    return failed(syntaxProblem(thrown, source));
  }
  const tangled = treeProblem(root);
  if (tangled) return failed(tangled);
  const yaml = root.children[0];
  if (yaml?.type !== 'yaml')
    return failed(
      problem(START, 'The front matter cannot be read. Put nothing but three hyphens on its first and last line.'),
    );
  const head = readFrontmatter(yaml.value, 1);
  const body = readBody(root, head.ok ? head.frontmatter : null);
  if (!head.ok) return failed(...head.errors, ...body.problems);
  if (body.problems.length) return failed(...body.problems);
  const procedure: Procedure = {
    frontmatter: head.frontmatter,
    intro: writeMarkdown(body.intro),
    steps: body.steps.map(({ id, title, cautions, children }) => ({
      id,
      title,
      cautions,
      body: writeMarkdown(children),
    })),
  };
  return { ok: true, frontmatter: head.frontmatter, placeOf: head.placeOf, body, procedure };
}

const meaning = (nodes: RootContent[]) =>
  JSON.stringify(nodes, (key, value: unknown) => (key === 'position' ? undefined : value));

/** The place of the first passage that does not read the same in both, or null where all do. */
function changedMeaning(before: Reading, after: Read): SourceProblem | null {
  const sentence =
    'This passage cannot be kept as it is written: signs of emphasis, lists or links run into each other. Write it plainer.';
  if (!after.ok) return problem(START, `${sentence} (${after.errors[0]?.message ?? ''})`);
  if (meaning(before.body.intro) !== meaning(after.body.intro))
    return problem(before.body.intro[0]?.position?.start, sentence, 'intro');
  const i = before.body.steps.findIndex((s, n) => meaning(s.children) !== meaning(after.body.steps[n]?.children ?? []));
  return i < 0 ? null : problem(before.body.steps[i]?.place, sentence, `steps.${i}.body`);
}

/**
 * Text of a procedure to the typed procedure, its rendered form, its canonical text and notices; or
 * to errors with line and column. Synchronous, bounded, evaluates nothing. The canonical text reads
 * back to the same meaning and to itself, or the text is refused.
 */
export function parseProcedure(source: string): Parsed {
  const large = sizeProblem(source);
  if (large) return { ok: false, errors: [large] };
  const text = plainLines(source);
  const typed = read(text);
  if (!typed.ok) return typed;
  let settled = typed;
  let canonical = toSource(typed.procedure);
  if (canonical !== text) {
    const again = read(canonical);
    const changed = changedMeaning(typed, again);
    if (changed || !again.ok) return { ok: false, errors: [changed ?? problem(START, 'This text cannot be kept.')] };
    const twice = toSource(again.procedure);
    if (twice !== canonical)
      return {
        ok: false,
        errors: [problem(START, 'This text cannot be kept: it does not come back as it is written.')],
      };
    settled = again;
    canonical = twice;
  }
  return {
    ok: true,
    procedure: settled.procedure,
    rendered: renderProcedure(settled),
    canonical,
    notices: inOrder(noticesOf(typed)),
    toFillIn: inOrder(toFillIn(typed)),
  };
}
