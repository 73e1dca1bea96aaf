import type { Element as HastElement, Root as HastRoot } from 'hast';
import { toHtml } from 'hast-util-to-html';
import type { Link, Parents, PhrasingContent, Root, RootContent } from 'mdast';
import remarkRehype, { type Options } from 'remark-rehype';
import { unified } from 'unified';
import { visit } from 'unist-util-visit';
import { isElement, type Element } from './attributes';
import { plainLinesOf, plainWords } from './plain';
import { referencesIn, startsSentence } from './references';
import { componentNodes, h } from './renderComponents';
import type { Frontmatter } from './schema';
import type { RenderedProcedure, RenderedStep } from './types';

type Handlers = NonNullable<Options['handlers']>;
type Handler = NonNullable<Handlers['link']>;

/** Cleaned trees of a procedure, as the parser leaves them. */
export interface Renderable {
  frontmatter: Frontmatter;
  body: {
    intro: RootContent[];
    steps: { id: string; title: string; cautions: string[]; children: RootContent[] }[];
  };
}

function handlersFor(head: Frontmatter): Handlers {
  const component: Handler = (_, node: Element, parent: Parents | undefined) => {
    const siblings = (parent?.children ?? []) as PhrasingContent[];
    return componentNodes(node, head, startsSentence(siblings, siblings.indexOf(node as PhrasingContent)));
  };
  const link: Handler = (state, node: Link) =>
    h('a', { href: node.url, rel: ['noopener'] }, ...(state.all(node) as HastElement[]));
  return { mdxJsxTextElement: component, mdxJsxFlowElement: component, link };
}

/** Headings of a table say which way they head; alignment goes without the obsolete attribute. */
function tidyTables(tree: HastRoot): void {
  visit(tree, 'element', (element: HastElement) => {
    if (element.tagName !== 'th' && element.tagName !== 'td') return;
    const { align } = element.properties;
    if (typeof align === 'string') element.properties['dataAlign'] = align;
    delete element.properties['align'];
    if (element.tagName === 'th' && element.properties['scope'] === undefined) element.properties['scope'] = 'col';
  });
}

const isHold = (node: RootContent) =>
  node.type === 'paragraph' &&
  node.children.length === 1 &&
  node.children.some((c) => isElement(c) && c.name === 'Hold');

/** Renders one procedure: cleaned nodes to a safe HTML string. Raw HTML does not exist in the tree. */
function htmlWriter(head: Frontmatter): (nodes: RootContent[]) => string {
  const toHast = unified()
    .use(remarkRehype, { handlers: handlersFor(head) })
    .freeze();
  return (nodes) => {
    const root: Root = { type: 'root', children: nodes.filter((node) => !isHold(node)) };
    const tree = toHast.runSync(root) as HastRoot;
    tidyTables(tree);
    return toHtml(tree);
  };
}

export function renderProcedure({ frontmatter, body }: Renderable): RenderedProcedure {
  const html = htmlWriter(frontmatter);
  const steps = body.steps.map(({ id, title, cautions, children }, i): RenderedStep => {
    const holds = children
      .filter(isHold)
      .map((node) => (node.type === 'paragraph' ? plainWords(node.children, frontmatter, 'both') : ''));
    return {
      id,
      number: i + 1,
      title,
      cautions,
      html: html(children),
      holds,
      references: referencesIn(children),
      text: plainLinesOf(children, frontmatter).join('\n'),
    };
  });
  return { frontmatter, introHtml: html(body.intro), steps };
}
