import { Schema, type MarkSpec, type Node, type NodeSpec } from 'prosemirror-model';
import { COMPONENTS, type Attributes } from '../../procedure/components';
import { linkFault } from '../../procedure/links';

/**
 * What a field of words can hold: the prose and the components of a sheet, and nothing else. A step may hold all of
 * them; the introduction has no hold points and no worksheets.
 */
export type Where = 'step' | 'intro';

const ONLY_IN_STEPS = ['Hold', 'Worksheet'];

/** Names of the components that are chips: they hold no words of their own. */
const chipNames = (stands: 'sentence' | 'block') =>
  Object.entries(COMPONENTS).flatMap(([name, component]) =>
    component.stands === stands && component.holds === 'nothing' && name !== 'Caution' ? [name] : [],
  );

export const SENTENCE_CHIPS: readonly string[] = chipNames('sentence');
export const BLOCK_CHIPS: readonly string[] = chipNames('block');
export const isChip = (node: Node) => SENTENCE_CHIPS.includes(node.type.name) || BLOCK_CHIPS.includes(node.type.name);

/** A chip or a hold point that is not among words. */
export const standsAlone = (node: Node) => BLOCK_CHIPS.includes(node.type.name) || node.type.name === 'Hold';

/** Attributes of a chip as they are written: those that it has, in their order. */
export const givenOf = (node: Node): Attributes =>
  Object.fromEntries(
    Object.keys(COMPONENTS[node.type.name]?.attributes ?? {}).flatMap((name) =>
      typeof node.attrs[name] === 'string' ? [[name, node.attrs[name] as string]] : [],
    ),
  );

/** In copied HTML every attribute stands under a name of its own, so that a chip comes back whole. */
const DATA = 'data-given-';

function chipSpec(name: string, inline: boolean): NodeSpec {
  const names = Object.keys(COMPONENTS[name]?.attributes ?? {});
  return {
    ...(inline ? { inline: true, group: 'words' } : { group: 'standing' }),
    atom: true,
    draggable: false,
    attrs: Object.fromEntries(names.map((attribute) => [attribute, { default: null }])),
    leafText: (node) => `[${name} ${Object.values(givenOf(node)).join(' ')}]`,
    toDOM: (node) => [
      inline ? 'span' : 'div',
      {
        'data-component': name,
        ...Object.fromEntries(Object.entries(givenOf(node)).map(([attribute, text]) => [DATA + attribute, text])),
      },
    ],
    parseDOM: [
      {
        tag: `[data-component="${name}"]`,
        getAttrs: (element) =>
          Object.fromEntries(names.map((attribute) => [attribute, element.getAttribute(DATA + attribute)])),
      },
    ],
  };
}

const cell = (tag: 'td' | 'th', tableRole: string): NodeSpec => ({
  content: 'words*',
  tableRole,
  isolating: true,
  attrs: { colspan: { default: 1 }, rowspan: { default: 1 }, colwidth: { default: null }, align: { default: null } },
  parseDOM: [{ tag, getAttrs: (element) => ({ align: element.getAttribute('data-align') }) }],
  toDOM: (node) => [tag, node.attrs['align'] ? { 'data-align': node.attrs['align'] as string } : {}, 0],
});

const list = (tag: 'ul' | 'ol', attrs: NodeSpec['attrs']): NodeSpec => ({
  content: 'list_item+',
  group: 'prose',
  attrs: { ...attrs, spread: { default: false } },
  parseDOM: [
    {
      tag,
      getAttrs: (element) => ({
        ...(tag === 'ol' && { order: Number(element.getAttribute('start') ?? 1) }),
        spread: element.hasAttribute('data-spread'),
      }),
    },
  ],
  toDOM: (node) => [
    tag,
    {
      ...(node.attrs['order'] !== undefined && node.attrs['order'] !== 1 && { start: String(node.attrs['order']) }),
      ...(node.attrs['spread'] === true && { 'data-spread': '' }),
    },
    0,
  ],
});

const NODES: Record<string, NodeSpec> = {
  doc: { content: '(prose | standing)+' },
  paragraph: {
    content: '(words | hard_break)*',
    group: 'prose',
    parseDOM: [{ tag: 'p' }],
    toDOM: () => ['p', 0],
  },
  bullet_list: list('ul', {}),
  ordered_list: list('ol', { order: { default: 1 } }),
  list_item: { content: 'prose+', defining: true, parseDOM: [{ tag: 'li' }], toDOM: () => ['li', 0] },
  blockquote: {
    content: 'prose+',
    group: 'prose',
    defining: true,
    parseDOM: [{ tag: 'blockquote' }],
    toDOM: () => ['blockquote', 0],
  },
  table: {
    content: 'table_row+',
    group: 'prose',
    tableRole: 'table',
    isolating: true,
    parseDOM: [{ tag: 'table' }],
    toDOM: () => ['table', ['tbody', 0]],
  },
  table_row: {
    content: '(table_cell | table_header)+',
    tableRole: 'row',
    parseDOM: [{ tag: 'tr' }],
    toDOM: () => ['tr', 0],
  },
  table_cell: cell('td', 'cell'),
  table_header: cell('th', 'header_cell'),
  Hold: {
    content: '(words | hard_break)*',
    group: 'standing',
    defining: true,
    isolating: true,
    parseDOM: [{ tag: '[data-component="Hold"]', contentElement: 'p' }],
    toDOM: () => [
      'div',
      { 'data-component': 'Hold' },
      ['span', { contenteditable: 'false', class: 'hold-word' }, 'Hold point'],
      ['p', 0],
    ],
  },
  ...Object.fromEntries(BLOCK_CHIPS.map((name) => [name, chipSpec(name, false)])),
  text: { group: 'words' },
  ...Object.fromEntries(SENTENCE_CHIPS.map((name) => [name, chipSpec(name, true)])),
  hard_break: {
    inline: true,
    selectable: false,
    linebreakReplacement: true,
    parseDOM: [{ tag: 'br' }],
    toDOM: () => ['br'],
  },
};

/**
 * `span` tells apart two stretches of the same kind that touch, as they stood in the text; 0 is one that was made in
 * the field. `edges` is one whose first or last sign is a space on purpose.
 */
const ATTRS = { span: { default: 0 }, edges: { default: false } };

const MARKS: Record<string, MarkSpec> = {
  emphasis: {
    attrs: ATTRS,
    parseDOM: [{ tag: 'em' }, { tag: 'i' }],
    toDOM: () => ['em', 0],
  },
  strong: {
    attrs: ATTRS,
    parseDOM: [{ tag: 'strong' }, { tag: 'b' }],
    toDOM: () => ['strong', 0],
  },
  link: {
    attrs: { ...ATTRS, href: {} },
    inclusive: false,
    parseDOM: [
      {
        tag: 'a[href]',
        getAttrs: (element) => {
          const href = element.getAttribute('href') ?? '';
          return linkFault(href) === null ? { href } : false;
        },
      },
    ],
    toDOM: (mark) => ['a', { href: mark.attrs['href'] as string, rel: 'noopener' }, 0],
  },
  code: { attrs: ATTRS, code: true, parseDOM: [{ tag: 'code' }], toDOM: () => ['code', 0] },
};

const without = (names: readonly string[]) =>
  Object.fromEntries(Object.entries(NODES).filter(([name]) => !names.includes(name)));

export const SCHEMAS: Readonly<Record<Where, Schema>> = {
  step: new Schema({ nodes: NODES, marks: MARKS }),
  intro: new Schema({ nodes: without(ONLY_IN_STEPS), marks: MARKS }),
};

/** A node type of a schema that is certain to have it. */
export function typeOf(schema: Schema, name: string) {
  const type = schema.nodes[name];
  if (!type) throw new Error(`A field has no ${name}.`);
  return type;
}

export function markOf(schema: Schema, name: string) {
  const type = schema.marks[name];
  if (!type) throw new Error(`A field has no ${name}.`);
  return type;
}
