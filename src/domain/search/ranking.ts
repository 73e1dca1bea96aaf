import type { SearchDocument } from './documents';
import type { Answer } from './match';
import type { Asked, Query } from './query';
import { groupToken, isGroupToken } from './tokens';
import { nameOf, type ValueMatch } from './values';

/** Every sheet's score for a query, before any filter. */
export interface Ranked {
  query: Query;
  /** By place in the book; 0 where the sheet is not on the list. */
  scores: Float32Array;
  /** Tokens of the index that the query met. */
  terms: ReadonlySet<string>;
  values: ReadonlyMap<number, ValueMatch[]>;
  /** True where nothing held all of the query, and these only come near. */
  near: boolean;
}

interface Given {
  documents: readonly SearchDocument[];
  query: Query;
  found: { answer: Answer | null; near: boolean };
  values: ReadonlyMap<number, ValueMatch[]>;
  tokensOf: (text: string) => readonly string[];
}

const NONE: ReadonlySet<string> = new Set();
const VALUE_COUNTS = 1.5;
const NAME_COUNTS = 0.8;
const NUMBER_COUNTS = 20;

/** Digits of "P-0142" without leading zeros. */
const digitsOf = (number: string): string => number.replace(/^P-0*/, '');

/** How well the values of a sheet answer, 0 to about 2: the best one, more where its own name was asked for too. */
function worthOf(
  document: SearchDocument,
  matches: readonly ValueMatch[],
  { query, tokensOf }: Given,
  wanted: ReadonlySet<string>,
): number {
  return matches.reduce((best, match) => {
    const named = wanted.size > 0 && tokensOf(nameOf(document, match)).some((token) => wanted.has(token));
    return Math.max(best, match.score / query.quantities.length + (named ? NAME_COUNTS : 0));
  }, 0);
}

/** Narrows to sheets that hold both the words and the values; where there are none, takes either. Returns whether it had to. */
function addValues(scores: Float32Array, given: Given): boolean {
  const { documents, query, values } = given;
  const inWords = query.asked.length > 0;
  const places = [...values.keys()];
  const both = inWords ? places.filter((at) => (scores[at] as number) > 0) : places;
  const wanted = new Set(query.asked.flatMap((one) => [...one.words, ...one.groups.map(groupToken)]));
  const worth = (at: number): number => worthOf(documents[at] as SearchDocument, values.get(at) ?? [], given, wanted);
  if (both.length === 0) {
    for (const at of places) scores[at] = worth(at);
    return inWords;
  }
  const answers = (at: number): number => Math.max(...(values.get(at) ?? []).map((match) => match.answers));
  const most = Math.max(...both.map(answers));
  const before = scores.slice();
  scores.fill(0);
  for (const at of both) if (answers(at) === most) scores[at] = (before[at] as number) + VALUE_COUNTS * worth(at);
  return false;
}

/** Puts sheets first whose number was typed, whole or from its beginning. Returns whether there are any. */
function addNumber(scores: Float32Array, documents: readonly SearchDocument[], number: string): boolean {
  let any = false;
  documents.forEach((document, at) => {
    const digits = digitsOf(document.number);
    if (!digits.startsWith(number)) return;
    any = true;
    scores[at] = (scores[at] as number) + (digits === number ? NUMBER_COUNTS : NUMBER_COUNTS / 2);
  });
  return any;
}

/** Puts words, values and numbers together. Without a query every sheet is on the list, in the order of the book. */
export function rank(given: Given): Ranked {
  const { documents, query, found, values } = given;
  const { asked, quantities, number } = query;
  const terms = found.answer?.terms ?? NONE;
  const nothing = asked.length === 0 && quantities.length === 0 && number === null;
  if (nothing) return { query, scores: new Float32Array(documents.length).fill(1), terms, values, near: false };

  const scores = found.answer?.scores.slice() ?? new Float32Array(documents.length);
  const top = scores.reduce((most, one) => Math.max(most, one), 0);
  if (top > 0) for (let at = 0; at < scores.length; at += 1) scores[at] = (scores[at] as number) / top;
  let { near } = found;
  if (quantities.length > 0) near = addValues(scores, given) || near;
  if (number !== null && addNumber(scores, documents, number)) near = false;
  return { query, scores, terms, values, near };
}

/** Below any score that words or values give. */
const PROSE_COUNTS = 1e-6;

/**
 * Adds sheets whose prose holds all that was asked for. They follow the sheets found without it, and take the place of those
 * that only come near.
 *
 * @param inProse numbers of sheets, best first
 */
export function withProse(
  ranked: Ranked,
  inProse: ReadonlyMap<string, unknown>,
  placeOf: ReadonlyMap<string, number>,
): Ranked & { proseOnly: ReadonlySet<number> } {
  const proseOnly = new Set<number>();
  const places = [...inProse.keys()].flatMap((number) => placeOf.get(number) ?? []);
  const scores = ranked.near && places.length > 0 ? new Float32Array(ranked.scores.length) : ranked.scores.slice();
  places.forEach((at, i) => {
    if (scores[at] !== 0) return;
    proseOnly.add(at);
    scores[at] = PROSE_COUNTS / (i + 1);
  });
  return { ...ranked, scores, proseOnly, near: ranked.near && places.length === 0 };
}

/**
 * Puts withdrawn sheets last, in their own order. They stay on the list: whoever looks for one must learn that it is
 * withdrawn, and not think that the book never had it.
 */
export function sink<R extends Ranked>(ranked: R, withdrawn: readonly number[]): R {
  if (withdrawn.length === 0) return ranked;
  const scores = ranked.scores.slice();
  for (const at of withdrawn) scores[at] = (scores[at] as number) * 1e-9;
  return { ...ranked, scores };
}

/** Share of what was asked for that stands in the title, and share of the title that was asked for. */
function inTitle(title: readonly string[], asked: readonly Asked[]): { met: number; covered: number } {
  const tokens = new Set(title);
  const words = title.filter((token) => !isGroupToken(token));
  const covered = new Set<string>();
  let met = 0;
  for (const one of asked) {
    const named = [...one.groups, ...one.completing].some((group) => tokens.has(groupToken(group)));
    const isOwn = (word: string): boolean =>
      one.words.some((typed) => word === typed || (one.unfinished && word.startsWith(typed)));
    const own = words.filter(isOwn);
    met += named ? 1 : Math.min(1, own.length / one.words.length);
    for (const word of own) covered.add(word);
  }
  return { met: met / Math.max(1, asked.length), covered: covered.size / Math.max(1, words.length) };
}

/** Only the best are looked at closely; what stands below is not seen before the query is narrower. */
const LOOKED_AT = 80;

/**
 * The first `limit` of the places kept, best first. The title has a say among those near the top; sheets of the same score
 * stay in the order of the book.
 */
export function best(
  kept: readonly number[],
  limit: number,
  { scores, query }: Ranked,
  titleTokens: (at: number) => readonly string[],
): number[] {
  const most = Math.max(limit, LOOKED_AT);
  const scoreOf = (at: number): number => scores[at] as number;
  let near = kept;
  if (kept.length > most) {
    const all = Float32Array.from(kept, scoreOf).sort();
    const least = all[all.length - most] as number;
    const above = kept.filter((at) => scoreOf(at) > least);
    near = [...above, ...kept.filter((at) => scoreOf(at) === least).slice(0, most - above.length)];
  }
  return near
    .map((at) => {
      const { met, covered } = inTitle(titleTokens(at), query.asked);
      return { at, score: scoreOf(at) * (1 + 0.7 * met + 0.5 * covered) };
    })
    .sort((a, b) => b.score - a.score || a.at - b.at)
    .slice(0, limit)
    .map(({ at }) => at);
}
