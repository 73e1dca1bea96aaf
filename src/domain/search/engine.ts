import { SYSTEMS } from '../procedure/systems';
import type { SearchDocument } from './documents';
import { bestValues, explain, type Matched } from './explain';
import { type Facets, type Filters, NO_FILTERS, Sieve } from './filters';
import { sayQuantity } from './quantities';
import { type Answer, answerAsked, mostly, together } from './match';
import { Postings } from './postings';
import { type Query, readQuery } from './query';
import { best, rank, type Ranked, sink, withProse } from './ranking';
import { tokensIn } from './tokens';
import { type UnitSystem, ValueIndex } from './values';
import { Phrases } from './phrases';
import type { VocabularyGroup } from './vocabulary';

/** An engine as far as search knows it. */
export interface SearchEngine {
  key: string;
  name: string;
  aliases: string[];
}

/** All that search works on; what the server sends and the page keeps. */
export interface SearchBook {
  documents: SearchDocument[];
  vocabulary: VocabularyGroup[];
  engines: SearchEngine[];
}

export type SearchHit = Pick<
  SearchDocument,
  | 'number'
  | 'title'
  | 'summary'
  | 'engines'
  | 'system'
  | 'minutes'
  | 'skill'
  | 'holds'
  | 'letter'
  | 'publishedAt'
  | 'book'
> & { withdrawn: boolean; matched: Matched[] };

export interface SearchAnswer {
  hits: SearchHit[];
  /** How many sheets the query and the filters leave; `hits` may be fewer. */
  total: number;
  /** True where nothing held all of the query and `hits` are only near it. */
  near: boolean;
  readAs: { quantities: string[]; synonyms: string[][] };
  facets: Facets;
}

export interface SearchOptions {
  /** How many hits to return with what matched. */
  limit?: number;
  units?: UnitSystem;
  /** Sheets found in their prose, by number, best first: they follow what is found without it. */
  inProse?: ReadonlyMap<string, Matched>;
}

/** One thing asked for, as words that each may stand for it, for a search of prose. */
export interface Wording {
  /** Any of these names; each may be several words. */
  anyOf: string[];
  /** True where the last word may go on. */
  unfinished: boolean;
}

export interface Search {
  /** What is asked for, in every wording; nothing where a measure is asked for, which prose is not searched for. */
  wordings(text: string): Wording[];
  query(text: string, filters?: Filters, options?: SearchOptions): SearchAnswer;
}

/** Longer queries say nothing more and only cost time. */
export const LONGEST_QUERY = 200;
const NO_PROSE: ReadonlyMap<string, Matched> = new Map();
const MOST_ASKED = 12;
const REMEMBERED = 32;

/** What is searched, with how much it says about what a sheet is for. `name` reads a text that comes back in many sheets. */
type Read = (text: string) => readonly string[];
const FIELDS: [boost: number, tokens: (d: SearchDocument, text: Read, name: Read, engine: Read) => string[]][] = [
  [6, (d, text) => [...text(d.title)]],
  [
    2.5,
    (d, _, name) => [
      ...d.parts.flatMap((part) => [...name(part.name), ...(part.number === null ? [] : name(part.number))]),
      ...d.torques.flatMap((torque) => [...name(torque.name), ...name(torque.thread)]),
      ...d.limits.flatMap((limit) => name(limit.name)),
    ],
  ],
  [
    2,
    (d, text, name, engine) => [...text(d.summary), ...name(SYSTEMS[d.system]), d.skill, ...d.engines.flatMap(engine)],
  ],
  [
    1,
    (d, text, name) => [
      ...d.steps.flatMap(text),
      ...d.tools.flatMap(name),
      ...d.timers.flatMap((timer) => name(timer.name)),
    ],
  ],
];

const answers = ({ scores }: Answer): boolean => scores.some((score) => score > 0);

/** All of it, else all of it with slips and other endings, else at least half of it. */
function findText(postings: Postings, query: Query): { answer: Answer | null; near: boolean } {
  const asked = query.asked.slice(0, MOST_ASKED);
  if (asked.length === 0) return { answer: null, near: false };
  const strict = asked.map((one) => answerAsked(postings, one, 'strict'));
  const all = together(postings, strict);
  if (answers(all)) return { answer: all, near: false };
  const loose = asked.map((one) => answerAsked(postings, one, 'loose'));
  const allLoose = together(postings, loose);
  if (answers(allLoose)) return { answer: allLoose, near: false };
  return { answer: mostly(postings, loose), near: true };
}

/** Keeps the last few answers: going back a letter, or setting a filter, costs nothing. */
function remember<T>(make: (key: string) => T): (key: string) => T {
  const kept = new Map<string, T>();
  return (key) => {
    const known = kept.get(key);
    const value = known ?? make(key);
    kept.delete(key);
    kept.set(key, value);
    const [oldest] = kept.keys();
    if (kept.size > REMEMBERED && oldest !== undefined) kept.delete(oldest);
    return value;
  };
}

/** "Tarn T18F" is also called "T18F": a type with a digit in it needs no maker. */
const namesOf = (name: string): string[] => [name, ...name.split(' ').filter((word) => /\p{L}\d|\d\p{L}/u.test(word))];

/** Search over a book. Pure and the same on the server and in the page, so that both rank alike. */
export function createSearch({ documents, vocabulary, engines }: SearchBook): Search {
  const phrases = new Phrases([
    ...vocabulary,
    ...engines.map(({ name, aliases }) => ({ terms: [...namesOf(name), ...aliases] })),
  ]);
  const tokensOf: Read = (text) => tokensIn(text, phrases);
  const known = new Map<string, readonly string[]>();
  const nameTokens: Read = (name) => {
    const tokens = known.get(name) ?? tokensOf(name);
    known.set(name, tokens);
    return tokens;
  };
  const byKey = new Map(engines.map((engine) => [engine.key, engine]));
  const engineTokens: Read = (key) => {
    const engine = byKey.get(key);
    return (engine ? [engine.name, ...engine.aliases] : [key]).flatMap(nameTokens);
  };
  const postings = new Postings(
    documents.length,
    FIELDS.map(([boost, tokens]) => ({
      boost,
      tokensOf: (at) => tokens(documents[at] as SearchDocument, tokensOf, nameTokens, engineTokens),
    })),
  );
  const values = new ValueIndex(documents);
  const sieve = new Sieve(documents);
  const told = new Set(engines.flatMap(({ key }) => engineTokens(key)));

  const rankOnce = remember((text): Ranked => {
    const query = readQuery(text, phrases, (word) => postings.has(word));
    return rank({
      documents,
      query,
      found: findText(postings, query),
      values: values.find(query.quantities),
      tokensOf: nameTokens,
    });
  });

  const withdrawn = documents.flatMap((document, at) => (document.withdrawn ? [at] : []));
  const placeOf = new Map(documents.map((document, at) => [document.number, at]));
  const synonymsOf = ({ asked }: Query): string[][] =>
    asked.flatMap(({ groups, completing }) =>
      (groups.length > 0 ? groups : completing).map((group) =>
        group < vocabulary.length ? phrases.names(group) : phrases.names(group).slice(0, 1),
      ),
    );

  return {
    wordings(text) {
      const { quantities, asked } = rankOnce(text.slice(0, LONGEST_QUERY)).query;
      if (quantities.length > 0) return [];
      return asked.map(({ groups, words, unfinished }) => ({
        anyOf: [words.join(' '), ...groups.flatMap((group) => phrases.names(group))],
        unfinished: unfinished && groups.length === 0,
      }));
    },
    query(text, filters = NO_FILTERS, { limit = 20, units = 'metric', inProse = NO_PROSE } = {}) {
      const ranked = sink(withProse(rankOnce(text.slice(0, LONGEST_QUERY)), inProse, placeOf), withdrawn);
      const { query, near } = ranked;
      const { kept, facets } = sieve.sift(ranked.scores, filters);
      const first = best(kept, limit, ranked, (at) => tokensOf(documents[at]?.title ?? ''));
      return {
        total: kept.length,
        near,
        facets,
        readAs: {
          quantities: query.quantities.map((quantity) => sayQuantity(quantity, units)),
          synonyms: synonymsOf(query),
        },
        hits: first.map((at): SearchHit => {
          const document = documents[at] as SearchDocument;
          const { number, title, summary, system, minutes, skill, holds, letter, publishedAt, book } = document;
          const named = bestValues(document, ranked.values.get(at) ?? [], ranked.terms, nameTokens);
          const matched = explain(document, ranked.terms, told, named, { phrases, nameTokens, tokensOf, units });
          const prose = ranked.proseOnly.has(at) ? inProse.get(number) : undefined;
          return {
            ...{ number, title, summary, system, minutes, skill, holds, letter, publishedAt, book },
            engines: document.engines,
            withdrawn: document.withdrawn ?? false,
            matched: prose ? [...matched, prose] : matched,
          };
        }),
      };
    },
  };
}
