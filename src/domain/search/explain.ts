import { SYSTEMS } from '../procedure/systems';
import type { SearchDocument } from './documents';
import { groupToken } from './tokens';
import { nameOf, sayValue, type UnitSystem, type ValueMatch } from './values';
import type { Phrases } from './phrases';
import { fold, wordRuns } from './words';

/** What matched, in words, and where in those words: `marks` are [start, end) places in `text`. */
export interface Matched {
  field: 'title' | 'summary' | 'torque' | 'limit' | 'timer' | 'part' | 'tool' | 'step' | 'system' | 'text';
  text: string;
  step: number | null;
  marks: [number, number][];
}

/** Places of `text` that any of the matched tokens stand at, in order, touching ones joined. */
export function marksIn(text: string, matched: ReadonlySet<string>, phrases: Phrases): [number, number][] {
  const marks: [number, number][] = [];
  for (const run of wordRuns(text)) {
    const folded = run.map((word) => fold(word.text));
    const hit = folded.map((word) => matched.has(word));
    folded.forEach((_, at) => {
      for (const { length, groups } of phrases.startingAt(folded, at))
        if (groups.some((group) => matched.has(groupToken(group)))) hit.fill(true, at, at + length);
    });
    run.forEach((word, at) => {
      if (!hit[at]) return;
      const last = marks.at(-1);
      if (last && hit[at - 1]) last[1] = word.end;
      else marks.push([word.start, word.end]);
    });
  }
  return marks;
}

interface Line {
  field: Matched['field'];
  text: string;
  step: number | null;
  tokens: readonly string[];
}

interface Reading {
  phrases: Phrases;
  tokensOf: (text: string) => readonly string[];
  /** The same for names that many sheets share, which are read once. */
  nameTokens: (name: string) => readonly string[];
  units: UnitSystem;
}

function linesOf(document: SearchDocument, { tokensOf, nameTokens }: Reading): Line[] {
  const at = (step: number | null): string => (step === null ? '' : `, step ${step}`);
  return [
    ...document.parts.map(({ name, number }): Line => ({
      field: 'part',
      text: number === null ? name : `${name}, ${number}`,
      step: null,
      tokens: number === null ? nameTokens(name) : [...nameTokens(name), ...nameTokens(number)],
    })),
    ...document.torques.map(({ name, thread, step }): Line => ({
      field: 'torque',
      text: `${name}, ${thread}${at(step)}`,
      step,
      tokens: nameTokens(name),
    })),
    ...document.limits.map(({ name, step }): Line => ({
      field: 'limit',
      text: name + at(step),
      step,
      tokens: nameTokens(name),
    })),
    ...document.steps.map((title, i): Line => ({
      field: 'step',
      text: `Step ${i + 1}: ${title}`,
      step: i + 1,
      tokens: tokensOf(title),
    })),
    ...document.tools.map((name): Line => ({ field: 'tool', text: name, step: null, tokens: nameTokens(name) })),
    {
      field: 'system',
      text: SYSTEMS[document.system],
      step: null,
      tokens: nameTokens(SYSTEMS[document.system]),
    },
  ];
}

const MOST_VALUES = 2;
const MOST_LINES = 2;

/**
 * Why a sheet is on the list, for the reader: the value that was asked for with what it is for, marked words of the
 * title and the summary, then the lines that account for what those do not.
 *
 * @param matched tokens of the index that the query met in this document
 * @param told tokens that need no line of their own, such as the engine's name, which the row shows anyway
 */
export function explain(
  document: SearchDocument,
  matched: ReadonlySet<string>,
  told: ReadonlySet<string>,
  values: readonly ValueMatch[],
  reading: Reading,
): Matched[] {
  const marked = (field: Matched['field'], text: string, step: number | null): Matched => ({
    field,
    text,
    step,
    marks: marksIn(text, matched, reading.phrases),
  });
  const head = [marked('title', document.title, null), marked('summary', document.summary, null)];
  const open = new Set([...matched].filter((token) => !told.has(token)));
  const account = (tokens: readonly string[]): void => {
    for (const token of tokens) open.delete(token);
  };
  const out = head.filter((line) => line.marks.length > 0);
  for (const line of out) account(reading.tokensOf(line.text));

  for (const match of values.slice(0, MOST_VALUES)) {
    const { value, rest, step } = sayValue(document, match, reading.units);
    const line = marked(match.kind, `${value} ${rest}`, step);
    const after = line.marks.filter(([start]) => start > value.length);
    out.push({ ...line, marks: [[0, value.length], ...after] });
    account(reading.tokensOf(rest));
  }

  const lines = open.size > 0 ? linesOf(document, reading) : [];
  for (let i = 0; i < MOST_LINES && open.size > 0; i += 1) {
    const best = lines
      .map((line) => ({ line, counts: line.tokens.filter((token) => open.has(token)).length }))
      .reduce<{ line: Line | null; counts: number }>((a, b) => (b.counts > a.counts ? b : a), {
        line: null,
        counts: 0,
      });
    if (!best.line) break;
    account(best.line.tokens);
    out.push(marked(best.line.field, best.line.text, best.line.step));
  }
  return out;
}

/**
 * The values worth telling: those that answer most of the quantities and whose own name was asked for too, the closest first.
 *
 * @param wanted tokens of the query
 */
export function bestValues(
  document: SearchDocument,
  matches: readonly ValueMatch[],
  wanted: ReadonlySet<string>,
  tokensOf: (text: string) => readonly string[],
): ValueMatch[] {
  const ranked = matches
    .map((match) => ({
      match,
      rank: match.answers + (tokensOf(nameOf(document, match)).some((token) => wanted.has(token)) ? 0.5 : 0),
    }))
    .sort((a, b) => b.rank - a.rank || b.match.score - a.match.score);
  return ranked.filter(({ rank }) => rank === ranked[0]?.rank).map(({ match }) => match);
}
