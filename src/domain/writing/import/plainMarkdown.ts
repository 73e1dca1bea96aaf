import type { Root } from 'mdast';
import remarkFrontmatter from 'remark-frontmatter';
import remarkGfm from 'remark-gfm';
import remarkParse from 'remark-parse';
import { unified } from 'unified';
import { sizeProblem, textProblem, treeProblem } from '../../procedure/bounds';
import { forbiddenCharacter } from '../../procedure/characters';
import { plainLines } from '../../procedure/source';
import type { SourceProblem } from '../../procedure/types';

/** Markdown as it is written elsewhere: tags are HTML and not components, braces are braces. */
const processor = unified()
  .use(remarkParse)
  .use(remarkFrontmatter, ['yaml'])
  .use(remarkGfm, { singleTilde: false })
  .freeze();

/** Signs that no keyboard writes do not stop an import; they are found again, word by word, and told. */
const withoutUnseen = (line: string) =>
  forbiddenCharacter(line) === null
    ? line
    : Array.from(line, (sign) => (forbiddenCharacter(sign) ? ' ' : sign)).join('');

/** Foreign Markdown to a tree, within the bounds of a sheet's own text; or the first bound that it breaks. */
export function readPlainMarkdown(source: string): { root: Root; text: string } | { problem: SourceProblem } {
  const large = sizeProblem(source);
  if (large) return { problem: large };
  const text = plainLines(source).split('\n').map(withoutUnseen).join('\n');
  // No front matter is read here, so the bounds of a body hold for every line.
  const bound = textProblem({ lines: text.split('\n'), headLines: 0 });
  if (bound) return { problem: bound };
  const root = processor.parse(text);
  const tangled = treeProblem(root);
  return tangled ? { problem: tangled } : { root, text };
}
