import type { Root, RootContent } from 'mdast';
import { mdxExpressionFromMarkdown, mdxExpressionToMarkdown } from 'mdast-util-mdx-expression';
import { mdxJsxFromMarkdown, mdxJsxToMarkdown } from 'mdast-util-mdx-jsx';
import { mdxExpression } from 'micromark-extension-mdx-expression';
import { mdxJsx } from 'micromark-extension-mdx-jsx';
import { mdxMd } from 'micromark-extension-mdx-md';
import remarkFrontmatter from 'remark-frontmatter';
import remarkGfm from 'remark-gfm';
import remarkParse from 'remark-parse';
import remarkStringify from 'remark-stringify';
import { unified, type Processor } from 'unified';

/**
 * Components and braces are recognised as syntax and never as program: without acorn no JavaScript
 * is even parsed. Expressions are read only so that they can be refused at their line and column.
 */
function componentsAsData(this: Processor) {
  const data = this.data();
  (data.micromarkExtensions ??= []).push(mdxJsx(), mdxExpression(), mdxMd());
  (data.fromMarkdownExtensions ??= []).push(mdxJsxFromMarkdown(), mdxExpressionFromMarkdown());
  (data.toMarkdownExtensions ??= []).push(
    mdxJsxToMarkdown({ printWidth: Infinity, quote: '"' }),
    mdxExpressionToMarkdown(),
  );
}

/**
 * remark-gfm looks for addresses a second time, in the finished text, where an escaped one can no longer be told
 * from a plain one; the text would then not come back as it was written. The first time, in the syntax, is enough.
 */
function addressesOnce(this: Processor) {
  for (const extension of (this.data().fromMarkdownExtensions ?? []).flat()) delete extension.transforms;
}

const processor = unified()
  .use(remarkParse)
  .use(remarkFrontmatter, ['yaml'])
  .use(remarkGfm, { singleTilde: false, tablePipeAlign: false })
  .use(addressesOnce)
  .use(componentsAsData)
  .use(remarkStringify, {
    bullet: '-',
    emphasis: '*',
    rule: '*',
    fences: true,
    listItemIndent: 'one',
    incrementListMarker: true,
    resourceLink: true,
    tightDefinitions: true,
    quote: '"',
  })
  .freeze();

/** Markdown with components to a tree. Throws a VFileMessage at a tag or a brace it cannot close. */
export function readMarkdown(text: string): Root {
  return processor.parse(text);
}

/** Tidied nodes to canonical Markdown, without a line end at the end. */
export function writeMarkdown(children: RootContent[]): string {
  return processor.stringify({ type: 'root', children }).replace(/\n+$/, '');
}
