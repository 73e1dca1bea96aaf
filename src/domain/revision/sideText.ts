import type { WordRun } from './types';
import { MEASURED } from './words';

/** A stretch of text that is set alike. `changed`: struck out in the old text, new in the other. */
export interface Span {
  text: string;
  changed: boolean;
  strong?: true;
  emphasis?: true;
  code?: true;
  /** A number with its unit. */
  value?: true;
  href?: string;
}

/** A paragraph's worth of one text, as it is laid out beside the other one. */
export interface Block {
  kind: 'paragraph' | 'item' | 'row' | 'quote' | 'hold' | 'aside';
  /** What stands before a list item: "•", "2."; empty otherwise. */
  marker: string;
  markerChanged: boolean;
  /** How deep a list item stands, from 0. */
  depth: number;
  /** One for each cell of a table's row, else one. */
  cells: Span[][];
}

export type Side = 'old' | 'new';

/** One of the two texts, and for each of its characters whether the other one has it. */
interface Marked {
  text: string;
  changed: boolean[];
}

function oneSide(runs: readonly WordRun[], side: Side): Marked {
  const own = side === 'old' ? 'removed' : 'added';
  const kept = runs.filter(({ kind }) => kind === 'same' || kind === own);
  return {
    text: kept.map(({ text }) => text).join(''),
    changed: kept.flatMap(({ kind, text }) => new Array<boolean>(text.length).fill(kind === own)),
  };
}

type Look = Omit<Span, 'text'>;
const LOOKS = ['changed', 'strong', 'emphasis', 'code', 'value', 'href'] as const;

function push(spans: Span[], text: string, look: Look): void {
  const last = spans.at(-1);
  if (last && LOOKS.every((key) => last[key] === look[key])) last.text += text;
  else spans.push({ text, ...look });
}

/** Blanks at the edge of a change are no part of it: a mark runs from letter to letter. */
function trimmed(spans: readonly Span[]): Span[] {
  const out: Span[] = [];
  for (const span of spans) {
    const [, before = '', text = '', after = ''] = /^(\s*)(.*?)(\s*)$/s.exec(span.text) ?? [];
    if (!span.changed || (!before && !after)) {
      push(out, span.text, lookOf(span));
      continue;
    }
    if (before) push(out, before, { ...lookOf(span), changed: false });
    if (text) push(out, text, lookOf(span));
    if (after) push(out, after, { ...lookOf(span), changed: false });
  }
  return out;
}
/** Numbers with their units are set as on a sheet. One that is changed in part stays as it is: it is told whole. */
const measured = (spans: readonly Span[]): Span[] =>
  spans.flatMap((span) => {
    if (span.code) return [span];
    const out: Span[] = [];
    let done = 0;
    for (const { 0: value, index } of span.text.matchAll(MEASURED)) {
      if (index > done) out.push({ ...span, text: span.text.slice(done, index) });
      out.push({ ...span, text: value, value: true });
      done = index + value.length;
    }
    return done < span.text.length ? [...out, { ...span, text: span.text.slice(done) }] : out;
  });
const lookOf = ({ text: _, ...look }: Span): Look => look;

const LINK = /\[((?:[^[\]\\]|\\.)*)\]\(([^\s()]*)(?: "[^"\n]*")?\)/y;
const ADDRESS = /<(https:[^\s<>]+)>/y;
const ENTITY = /&(?:#x([0-9a-f]{1,6})|(amp|lt|gt|quot));/iy;
const NAMED: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"' };

const matchAt = (pattern: RegExp, text: string, at: number) => {
  pattern.lastIndex = at;
  return pattern.exec(text);
};

/**
 * The inline marks of canonical Markdown, read for looks alone: in canonical text emphasis is always `*`, strong `**`,
 * and a mark that is meant as a character is escaped. A changed mark changes the words that it sets.
 */
function inline({ text, changed }: Marked, from: number, to: number, look: Look): Span[] {
  const spans: Span[] = [];
  const any = (start: number, end: number) => changed.slice(start, end).includes(true);
  let strong: boolean | null = null;
  let emphasis: boolean | null = null;
  for (let at = from; at < to;) {
    const now: Look = {
      ...look,
      ...(strong !== null && { strong: true as const }),
      ...(emphasis !== null && { emphasis: true as const }),
      changed: look.changed || (strong ?? false) || (emphasis ?? false),
    };
    const put = (words: string, end: number, more: Partial<Look> = {}) => {
      push(spans, words, { ...now, ...more, changed: now.changed || any(at, end) });
      at = end;
    };
    const char = text.charAt(at);
    if (char === '\\' && at + 1 < to) {
      put(text.charAt(at + 1), at + 2);
    } else if (char === '`') {
      const fence = /^`+/.exec(text.slice(at, to))?.[0] ?? '`';
      const close = text.indexOf(fence, at + fence.length);
      if (close === -1 || close >= to) put(fence, at + fence.length);
      else put(text.slice(at + fence.length, close).trim(), close + fence.length, { code: true });
    } else if (text.startsWith('**', at)) {
      strong = strong === null ? any(at, at + 2) : null;
      at += 2;
    } else if (char === '*') {
      emphasis = emphasis === null ? any(at, at + 1) : null;
      at += 1;
    } else if (text.startsWith('~~', at)) {
      at += 2;
    } else {
      const link = char === '[' ? matchAt(LINK, text, at) : null;
      const address = char === '<' ? matchAt(ADDRESS, text, at) : null;
      const entity = char === '&' ? matchAt(ENTITY, text, at) : null;
      if (link && at + link[0].length <= to) {
        const [whole, words = '', href = ''] = link;
        const target = any(at + words.length + 2, at + whole.length);
        spans.push(
          ...inline({ text, changed }, at + 1, at + 1 + words.length, { ...now, href, changed: now.changed || target }),
        );
        at += whole.length;
      } else if (address) put(address[1] ?? '', at + address[0].length, { href: address[1] ?? '' });
      else if (entity)
        put(entity[2] ? (NAMED[entity[2].toLowerCase()] ?? '') : fromHex(entity[1] ?? ''), at + entity[0].length);
      else put(char, at + 1);
    }
  }
  return spans;
}

const fromHex = (hex: string) => {
  const code = Number.parseInt(hex, 16);
  return code > 0 && code <= 0x10ffff ? String.fromCodePoint(code) : '';
};

const ITEM = /^(\s*)([-*+]|\d+[.)])\s+/;
const ROW = /^\s*\|.*\|\s*$/;
const RULER = /^\s*\|[\s:|-]+\|\s*$/;

/** Where the cells of a row stand: between the bars that are not escaped. */
function cellsOf(line: string): [from: number, to: number][] {
  const bars = [...line.matchAll(/\\.|\|/g)].filter(([mark]) => mark === '|').map(({ index }) => index);
  return bars.slice(0, -1).map((bar, i) => {
    const inside = line.slice(bar + 1, bars[i + 1]);
    const from = bar + 1 + (inside.length - inside.trimStart().length);
    return [from, Math.max(from, bar + 1 + inside.trimEnd().length)];
  });
}

/** One text out of a comparison of words, in blocks to be laid out, with what the other text has not. */
export function sideBlocks(runs: readonly WordRun[], side: Side): Block[] {
  const marked = oneSide(runs, side);
  const blocks: Block[] = [];
  let start = 0;
  for (const line of marked.text.split('\n')) {
    const at = start;
    start += line.length + 1;
    if (!line.trim() || RULER.test(line)) continue;
    const spans = (from: number, to = line.length) =>
      measured(trimmed(inline(marked, at + from, at + to, { changed: false })));
    const put = (kind: Block['kind'], cells: Span[][], more: Partial<Block> = {}) =>
      blocks.push({ kind, marker: '', markerChanged: false, depth: 0, cells, ...more });
    const [lead = '', indent = '', mark = ''] = ITEM.exec(line) ?? [];
    if (ROW.test(line))
      put(
        'row',
        cellsOf(line).map(([from, to]) => spans(from, to)),
      );
    else if (lead)
      put('item', [spans(lead.length)], {
        marker: /\d/.test(mark) ? mark : '•',
        markerChanged: marked.changed.slice(at, at + lead.length).includes(true),
        depth: Math.min(4, indent.length >> 1),
      });
    else if (line.startsWith('>')) put('quote', [spans(line.search(/[^>\s]/))]);
    else if (line.startsWith('Hold point. ')) put('hold', [spans(0)]);
    else if (/^(?:Figure|Worksheet): /.test(line)) put('aside', [spans(0)]);
    else put('paragraph', [spans(line.search(/\S/))]);
  }
  return blocks;
}

/** A line without Markdown, such as a title. */
export const sideLine = (runs: readonly WordRun[], side: Side): Span[] => {
  const own = side === 'old' ? 'removed' : 'added';
  return trimmed(
    runs
      .filter(({ kind }) => kind === 'same' || kind === own)
      .map(({ kind, text }) => ({ text, changed: kind === own })),
  );
};
