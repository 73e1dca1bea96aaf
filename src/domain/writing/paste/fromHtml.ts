import type { Element, ElementContent, Root } from 'hast';
import { Fragment, type Node, type Schema } from 'prosemirror-model';
import { typeOf } from '../field/schema';
import { gridOf } from './grid';
import { gapsClosed, leavesOf, nodesOf, PLAIN, settingIn, type Leaf, type Setting } from './leaves';
import { nothingLeftOut, type LeftOut } from './leftOut';
import { isElement, isHidden, isStruck, plainOf } from './style';
import { withRealLists } from './wordLists';

const BLOCKS =
  /^(p|div|h[1-6]|ul|ol|li|table|thead|tbody|tfoot|tr|td|th|caption|blockquote|pre|section|article|main|header|footer|nav|aside|figure|figcaption|dl|dt|dd|address|hr|center|form|fieldset|details|summary|html|body)$/;
const isBlock = (node: ElementContent): boolean => isElement(node) && BLOCKS.test(node.tagName);
const holdsBlocks = (node: ElementContent): boolean =>
  isElement(node) && (isBlock(node) || node.children.some(holdsBlocks));

/** Reads pasted HTML into what a field can hold; what it cannot hold is left out and noted. */
class Reader {
  readonly left: LeftOut = nothingLeftOut();
  constructor(private readonly schema: Schema) {}

  private paragraphs(given: readonly Leaf[]): Node[] {
    const leaves = gapsClosed(given);
    // Two line breaks in a row are how web pages divide paragraphs.
    const parts: Leaf[][] = [[]];
    leaves.forEach((leaf, i) => {
      if (leaf === 'break' && leaves[i + 1] === 'break') parts.push([]);
      else if (leaf !== 'break' || leaves[i - 1] !== 'break') parts.at(-1)?.push(leaf);
    });
    return parts.flatMap((part) => {
      const nodes = nodesOf(part, this.schema);
      return nodes.length ? [typeOf(this.schema, 'paragraph').create(null, nodes)] : [];
    });
  }

  private list(node: Element, setting: Setting): Node[] {
    const items: Node[][] = [];
    for (const child of node.children) {
      if (!isElement(child)) {
        const loose = child.type === 'text' ? child.value.trim() : '';
        if (loose) this.left.loose.push(loose);
        continue;
      }
      const blocks = this.blocks(child.tagName === 'li' ? child.children : [child], settingIn(child, setting));
      // Some write an inner list beside its point and not in it.
      const last = items.at(-1);
      if (child.tagName !== 'li' && last) last.push(...blocks);
      else if (blocks.length) items.push(blocks);
    }
    if (items.length === 0) return [];
    const nodes = items.map((blocks) => typeOf(this.schema, 'list_item').create(null, blocks));
    if (node.tagName !== 'ol') return [typeOf(this.schema, 'bullet_list').create(null, nodes)];
    const start = Number(node.properties['start'] ?? 1);
    const order = Number.isInteger(start) && start >= 0 && start < 1e9 ? start : 1;
    return [typeOf(this.schema, 'ordered_list').create({ order }, nodes)];
  }

  private cellNodes(cell: Element, setting: Setting): Node[] {
    const leaves = (nodes: readonly ElementContent[], inside: Setting): Leaf[] =>
      nodes.flatMap((node): Leaf[] =>
        isElement(node) && holdsBlocks(node) && !isHidden(node) && !isStruck(node)
          ? [
              { text: ' ', setting: PLAIN },
              ...leaves(node.children, settingIn(node, inside)),
              { text: ' ', setting: PLAIN },
            ]
          : leavesOf([node], inside, this.left),
      );
    return nodesOf(leaves(cell.children, setting), this.schema, false);
  }

  private table(node: Element, setting: Setting): Node[] {
    const rowsIn = (nodes: readonly ElementContent[]): Element[] =>
      nodes.flatMap((child) =>
        !isElement(child)
          ? []
          : child.tagName === 'tr'
            ? [child]
            : child.tagName === 'table'
              ? []
              : rowsIn(child.children),
      );
    const rows = rowsIn(node.children).map((row) =>
      row.children.filter((cell): cell is Element => isElement(cell) && /^t[dh]$/.test(cell.tagName)),
    );
    const grid = gridOf(rows);
    const columns = Math.max(0, ...grid.map((row) => row.length));
    // Often the condition of every number below it.
    const captions = node.children.filter((child) => isElement(child) && child.tagName === 'caption');
    const caption = this.blocks(captions, setting);
    // A frame round a whole page, not a table.
    if (columns < 2) return [...caption, ...rows.flat().flatMap((cell) => this.blocks(cell.children, setting))];
    const type = (r: number) => typeOf(this.schema, r === 0 ? 'table_header' : 'table_cell');
    // A cell that stands in several rows is read once, so that what it cannot hold is told once.
    const read = new Map<Element, Node[]>();
    const nodesIn = (cell: Element, r: number): Node[] => {
      const nodes = read.get(cell) ?? this.cellNodes(cell, r === 0 ? { ...PLAIN, settled: true } : setting);
      read.set(cell, nodes);
      return nodes;
    };
    const made = grid.map((row, r) => {
      const cells = row.map((cell) => type(r).create(null, cell ? nodesIn(cell, r) : []));
      while (cells.length < columns) cells.push(type(r).create());
      return typeOf(this.schema, 'table_row').create(null, cells);
    });
    return [...caption, typeOf(this.schema, 'table').create(null, made)];
  }

  private block(node: Element, given: Setting): Node[] {
    if (isHidden(node)) return [];
    if (isStruck(node)) {
      this.left.struck.push(plainOf(node.children).trim());
      return [];
    }
    const { tagName } = node;
    const setting = settingIn(node, given);
    // Titles are given to steps; here they stand out as strong words.
    if (/^h[1-6]$/.test(tagName)) return this.blocks(node.children, { ...PLAIN, strong: true, settled: true });
    if (tagName === 'ul' || tagName === 'ol') return this.list(node, setting);
    if (tagName === 'table') return this.table(node, setting);
    if (tagName === 'blockquote') {
      const inside = this.blocks(node.children, setting);
      return inside.length ? [typeOf(this.schema, 'blockquote').create(null, inside)] : [];
    }
    if (tagName === 'pre') {
      const leaves = plainOf(node.children)
        .split(/\r?\n/)
        .flatMap((text): Leaf[] => [{ text, setting }, 'break']);
      return this.paragraphs(leaves);
    }
    if (tagName === 'dt') return this.blocks(node.children, { ...setting, strong: true });
    return this.blocks(node.children, setting);
  }

  blocks(nodes: readonly ElementContent[], setting: Setting): Node[] {
    const out: Node[] = [];
    let line: Leaf[] = [];
    const flush = () => {
      out.push(...this.paragraphs(line));
      line = [];
    };
    for (const node of nodes) {
      if (!holdsBlocks(node)) {
        line.push(...leavesOf([node], setting, this.left));
        continue;
      }
      flush();
      // A wrapper that only changes how the words in it are set, around whole paragraphs.
      if (isElement(node)) out.push(...this.block(node, setting));
    }
    flush();
    return out;
  }
}

/** Words copied from a word processor or a page, as a field can hold them, and what was left out. */
export function fromHtml(root: Root, schema: Schema): { content: Fragment; left: LeftOut } {
  const reader = new Reader(schema);
  const nodes = root.children.filter((node): node is ElementContent => node.type !== 'doctype');
  return { content: Fragment.from(reader.blocks(withRealLists(nodes), PLAIN)), left: reader.left };
}
