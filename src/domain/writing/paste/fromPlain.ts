import { Fragment, type Node, type Schema } from 'prosemirror-model';
import { withoutForbidden } from '../../procedure/characters';
import { linkFault } from '../../procedure/links';
import { piecesOf } from '../field/fromTree';
import { readWords } from '../field/readWords';
import { markOf, typeOf, type Where } from '../field/schema';
import { nothingLeftOut, type LeftOut } from './leftOut';

const POINT = /^([ \t]*)(?:([-*•·])|(\d{1,4})[.)])[ \t]+(?=\S)/;
const COMPONENT = /<[A-Z][A-Za-z]*[\s/>]/;
const WHOLE_STEP = /^\s*<Step\b[^>]*>\n([^]*?)\n?<\/Step>\s*$/;
const CAUTION = /<Caution of="([^"]*)" ?\/>\s*/g;

interface Line {
  indent: number;
  /** Number of a numbered point, null of a bullet. */
  number: number | null;
  text: string;
}

function pointOf(line: string): Line | null {
  const found = POINT.exec(line);
  if (!found) return null;
  const [all, indent = '', , number] = found;
  return {
    indent: indent.replace(/\t/g, '    ').length,
    number: number ? Number(number) : null,
    text: line.slice(all.length),
  };
}

const tidy = (text: string) => withoutForbidden(text.replace(/[\t ]+/g, ' ').replace(/[\u200b\u00ad]/g, '')).trim();

/** Points of a list from lines that begin with a bullet or a number; deeper ones by their indent. */
function listOf(lines: readonly Line[], schema: Schema): Node[] {
  const out: Node[] = [];
  const [first] = lines;
  if (!first) return out;
  let items: Node[] = [];
  let head = first;
  const flush = () => {
    if (items.length === 0) return;
    out.push(
      head.number === null
        ? typeOf(schema, 'bullet_list').create(null, items)
        : typeOf(schema, 'ordered_list').create({ order: head.number }, items),
    );
    items = [];
  };
  for (let i = 0; i < lines.length;) {
    const line = lines[i];
    if (!line) break;
    if ((line.number === null) !== (head.number === null)) {
      flush();
      head = line;
    }
    let next = i + 1;
    while ((lines[next]?.indent ?? -1) > line.indent + 1) next += 1;
    const paragraph = typeOf(schema, 'paragraph').create(null, words(line.text, schema));
    items.push(typeOf(schema, 'list_item').create(null, [paragraph, ...listOf(lines.slice(i + 1, next), schema)]));
    i = next;
  }
  flush();
  return out;
}

function words(text: string, schema: Schema): Node[] {
  const tidied = tidy(text);
  return tidied ? [schema.text(tidied)] : [];
}

/** The address, where the pasted text is one that may be linked to and nothing else. */
export const addressIn = (text: string): string | null =>
  /^https:\/\/\S+$/i.test(text.trim()) && linkFault(text.trim()) === null ? text.trim() : null;

/**
 * Plain words as a field's nodes. Text with components of a sheet is read as a sheet's; of any other the signs are taken
 * as they stand, and only lines that begin with a bullet or a number become lists. Lines of a passage between blank
 * lines belong together; a text without a blank line has a paragraph in each line.
 */
export function fromPlain(text: string, schema: Schema, where: Where, left: LeftOut = nothingLeftOut()): Fragment {
  const plain = text.replace(/\r\n?/g, '\n');
  if (COMPONENT.test(plain)) {
    const own = WHOLE_STEP.exec(plain)?.[1] ?? plain;
    const read = readWords(own.replace(CAUTION, '').trim(), where);
    if (read.ok) {
      left.cautions.push(...[...own.matchAll(CAUTION)].map(([, key = '']) => key));
      return piecesOf(read.nodes, schema);
    }
  }
  const address = addressIn(plain);
  if (address) {
    const link = markOf(schema, 'link').create({ href: address });
    return Fragment.from(typeOf(schema, 'paragraph').create(null, schema.text(address, [link])));
  }
  const passages = plain.trim().split(/\n[ \t]*\n\s*/);
  const whole = passages.length > 1;
  const out: Node[] = [];
  let points: Line[] = [];
  let lines: string[] = [];
  const flush = () => {
    for (const line of whole ? [lines.join(' ')] : lines) {
      const nodes = words(line, schema);
      if (nodes.length) out.push(typeOf(schema, 'paragraph').create(null, nodes));
    }
    lines = [];
  };
  const flushPoints = () => {
    out.push(...listOf(points, schema));
    points = [];
  };
  passages.forEach((passage, at) => {
    for (const line of passage.split('\n')) {
      const point = pointOf(line);
      const last = points.at(-1);
      if (point) {
        flush();
        points.push(point);
      } else if (last && whole && /^\s+\S/.test(line)) last.text += ` ${line.trim()}`;
      else {
        flushPoints();
        lines.push(line);
      }
    }
    flush();
    // Points with blank lines between them are still one list.
    if (!pointOf(passages[at + 1] ?? '')) flushPoints();
  });
  return Fragment.from(out);
}
