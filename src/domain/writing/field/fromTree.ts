import type { BlockContent, Nodes, PhrasingContent, RootContent, Table } from 'mdast';
import { Fragment, type Mark, type Node, type Schema } from 'prosemirror-model';
import { isElement } from '../../procedure/attributes';
import { given } from '../../procedure/references';
import { markOf, typeOf } from './schema';

/** Whether a stretch of words begins or ends in a space or a line break of its own. */
function hasLooseEdges(nodes: readonly PhrasingContent[]): boolean {
  const loose = (node: Nodes | undefined, at: 'first' | 'last'): boolean => {
    if (!node) return false;
    if (node.type === 'break') return true;
    if (node.type === 'text') return at === 'first' ? /^\s/.test(node.value) : /\s$/.test(node.value);
    return 'children' in node && loose(node.children.at(at === 'first' ? 0 : -1), at);
  };
  return loose(nodes[0], 'first') || loose(nodes.at(-1), 'last');
}

/** Turns the tree of a sheet's words into what a field shows; one is made for each text, because it counts stretches. */
class Maker {
  private spans = 0;
  constructor(private readonly schema: Schema) {}

  private mark(name: string, attrs: object, children: readonly PhrasingContent[], marks: readonly Mark[]): Node[] {
    const mark = markOf(this.schema, name).create({ ...attrs, span: ++this.spans, edges: hasLooseEdges(children) });
    return this.words(children, mark.addToSet(marks));
  }

  words(nodes: readonly PhrasingContent[], marks: readonly Mark[] = []): Node[] {
    return nodes.flatMap((node): Node[] => {
      switch (node.type) {
        case 'text':
          return node.value ? [this.schema.text(node.value, marks)] : [];
        case 'break':
          return [typeOf(this.schema, 'hard_break').create(null, null, marks)];
        case 'inlineCode': {
          const code = markOf(this.schema, 'code').create({ span: ++this.spans });
          return node.value ? [this.schema.text(node.value, code.addToSet(marks))] : [];
        }
        case 'emphasis':
        case 'strong':
          return this.mark(node.type, {}, node.children, marks);
        case 'link':
          return this.mark('link', { href: node.url }, node.children, marks);
        case 'mdxJsxTextElement':
          return node.name ? [typeOf(this.schema, node.name).create(given(node), null, marks)] : [];
        default:
          throw new Error(`A field does not show ${node.type}.`);
      }
    });
  }

  private table(node: Table): Node {
    const rows = node.children.map((row, r) =>
      typeOf(this.schema, 'table_row').create(
        null,
        row.children.map((cell, column) =>
          typeOf(this.schema, r === 0 ? 'table_header' : 'table_cell').create(
            { align: node.align?.[column] ?? null },
            // A cell has no lines of its own.
            Fragment.from(this.words(cell.children.filter((child) => child.type !== 'break'))),
          ),
        ),
      ),
    );
    return typeOf(this.schema, 'table').create(null, rows);
  }

  private inside(nodes: readonly RootContent[]): Node[] {
    const blocks = this.blocks(nodes);
    return blocks.length ? blocks : [typeOf(this.schema, 'paragraph').create()];
  }

  block(node: RootContent | BlockContent): Node {
    switch (node.type) {
      case 'paragraph': {
        const [only] = node.children;
        if (node.children.length === 1 && only && isElement(only) && only.name === 'Hold')
          return typeOf(this.schema, 'Hold').create(null, this.words(only.children as PhrasingContent[]));
        return typeOf(this.schema, 'paragraph').create(null, this.words(node.children));
      }
      case 'list': {
        const items = node.children.map((item) =>
          typeOf(this.schema, 'list_item').create(null, this.inside(item.children)),
        );
        const spread = node.spread === true;
        return node.ordered
          ? typeOf(this.schema, 'ordered_list').create({ order: node.start ?? 1, spread }, items)
          : typeOf(this.schema, 'bullet_list').create({ spread }, items);
      }
      case 'blockquote':
        return typeOf(this.schema, 'blockquote').create(null, this.inside(node.children));
      case 'table':
        return this.table(node);
      case 'mdxJsxFlowElement':
        return typeOf(this.schema, node.name ?? '').create(given(node));
      default:
        throw new Error(`A field does not show ${node.type}.`);
    }
  }

  blocks = (nodes: readonly RootContent[]): Node[] => nodes.map((node) => this.block(node));

  document = (nodes: readonly RootContent[]): Node => typeOf(this.schema, 'doc').create(null, this.inside(nodes));
}

/** A field's document for cleaned nodes of a sheet (`readWords` gives them). */
export const documentOf = (nodes: readonly RootContent[], schema: Schema): Node => new Maker(schema).document(nodes);

/** The same for nodes that go into a document; empty for none. */
export const piecesOf = (nodes: readonly RootContent[], schema: Schema): Fragment =>
  Fragment.from(new Maker(schema).blocks(nodes));
