import type { Node, Parent } from 'unist';
import { forbiddenCharacter, forbiddenSentence } from './characters';
import { problem, START } from './problems';
import type { SourceLines } from './source';
import type { SourceProblem } from './types';

/**
 * What a text may be before it meets a parser. Markdown and YAML parsers can be made to run for
 * many seconds by a small text (thousands of nested lists, wide tables with short rows, endless
 * brackets). These counts are taken in one pass over the characters and keep every parse short.
 */
export const BOUNDS = {
  bytes: 65_536,
  lines: 2_000,
  lineCharacters: 4_000,
  indent: 40,
  markersInLine: 6,
  markers: 1_200,
  markupInBlock: 250,
  markup: 4_000,
  pipes: 1_500,
  headNesting: 12,
  headSeparators: 6_000,
  headFields: 4_000,
  treeDepth: 24,
  componentDepth: 6,
  nodes: 20_000,
  columns: 20,
} as const;

const MARKUP = /[*_[\]!<>&~`{}\\@]/g;
const MARKER = /^[ \t]*(?:>|[-+*](?=[ \t]|$)|\d{1,9}[.)](?=[ \t]|$))/;

const byteLength = (text: string) => new TextEncoder().encode(text).length;

function indentOf(line: string): number {
  let columns = 0;
  for (const c of line) {
    if (c === ' ') columns += 1;
    else if (c === '\t') columns += 4 - (columns % 4);
    else break;
  }
  return columns;
}

function markersOf(line: string): number {
  let rest = line;
  let count = 0;
  for (let found = MARKER.exec(rest); found; found = MARKER.exec(rest)) {
    rest = rest.slice(found[0].length);
    count += 1;
    if (count > BOUNDS.markersInLine) break;
  }
  return count;
}

/** The first reason why `source` is too large or too tangled to read, or null. */
export function sizeProblem(source: string): SourceProblem | null {
  if (source.length > BOUNDS.bytes || byteLength(source) > BOUNDS.bytes)
    return problem(START, 'The text is larger than 64 KB. Divide it into two procedures.');
  return null;
}

/** The first reason why a front matter is too tangled to read, or null. */
export function headProblem({ lines, headLines }: SourceLines): SourceProblem | null {
  let depth = 0;
  let separators = 0;
  let fields = 0;
  for (let i = 0; i < headLines; i += 1) {
    const line = lines[i] ?? '';
    for (const c of line) {
      if (c === '[' || c === '{') depth += 1;
      else if (c === ']' || c === '}') depth = Math.max(0, depth - 1);
      else if (c === ',') separators += 1;
      else if (c === ':') fields += 1;
    }
    const at = { line: i + 1, column: 1 };
    if (depth > BOUNDS.headNesting || indentOf(line) > BOUNDS.indent)
      return problem(at, 'The front matter is nested too deeply here. Write plain lists as the blank procedure does.');
    // A reader of YAML compares each name with all before it.
    if (separators > BOUNDS.headSeparators || fields > BOUNDS.headFields)
      return problem(at, 'The front matter holds too many values from here on.');
  }
  return null;
}

function bodyProblem({ lines, headLines }: SourceLines): SourceProblem | null {
  let markers = 0;
  let markup = 0;
  let inBlock = 0;
  let pipes = 0;
  for (let i = headLines; i < lines.length; i += 1) {
    const line = lines[i] ?? '';
    const at = { line: i + 1, column: 1 };
    if (line.length > BOUNDS.lineCharacters)
      return problem(at, 'This line is longer than 4,000 characters. Divide it into paragraphs.');
    if (indentOf(line) > BOUNDS.indent)
      return problem(at, 'This line is indented more than 40 columns. Move it to the left.');
    const here = markersOf(line);
    markers += here;
    if (here > BOUNDS.markersInLine)
      return problem(at, 'Lists and quotations stand more than six deep in this line. Write it flatter.');
    if (markers > BOUNDS.markers)
      return problem(at, 'The text has more than 1,200 list and quotation marks. Divide it into two procedures.');
    const signs = line.match(MARKUP)?.length ?? 0;
    markup += signs;
    inBlock = line.trim() === '' ? 0 : inBlock + signs;
    if (inBlock > BOUNDS.markupInBlock)
      return problem(
        at,
        'This passage has more than 250 formatting signs. Divide it with a blank line, or write it plainer.',
      );
    if (markup > BOUNDS.markup) return problem(at, 'The text has more than 4,000 formatting signs. Write it plainer.');
    pipes += line.split('|').length - 1;
    if (pipes > BOUNDS.pipes) return problem(at, 'The tables are too large: more than 1,500 cells up to here.');
  }
  return null;
}

/** Bounds on the bare text: the first one that is passed, or null. Linear in the length of the text. */
export function textProblem(source: SourceLines): SourceProblem | null {
  if (source.lines.length > BOUNDS.lines)
    return problem(
      { line: BOUNDS.lines + 1, column: 1 },
      'The text has more than 2,000 lines. Divide it into two procedures.',
    );
  for (const [i, line] of source.lines.entries()) {
    const found = forbiddenCharacter(line);
    if (found) return problem({ line: i + 1, column: found.index + 1 }, forbiddenSentence(found.what));
  }
  return headProblem(source) ?? bodyProblem(source);
}

/** Bounds on the parsed tree. Walks with a list of its own, so that no depth can exhaust the stack. */
export function treeProblem(root: Node): SourceProblem | null {
  const waiting: { node: Node; depth: number; components: number }[] = [{ node: root, depth: 0, components: 0 }];
  let nodes = 0;
  for (let next = waiting.pop(); next; next = waiting.pop()) {
    const { node, depth } = next;
    const components = next.components + (node.type.startsWith('mdxJsx') ? 1 : 0);
    nodes += 1;
    const at = node.position?.start;
    if (nodes > BOUNDS.nodes) return problem(at, 'The text is made of too many pieces. Divide it into two procedures.');
    if (depth > BOUNDS.treeDepth || components > BOUNDS.componentDepth)
      return problem(at, 'The text is nested too deeply here. Write it flatter.');
    const children = 'children' in node ? (node as Parent).children : [];
    if (node.type === 'tableRow' && children.length > BOUNDS.columns)
      return problem(at, 'This table has more than 20 columns. Turn it, or divide it.');
    for (const child of children) waiting.push({ node: child, depth: depth + 1, components });
  }
  return null;
}
