import type { SearchBook } from './engine';
import type { SearchDocument } from './documents';

/**
 * How a book crosses the wire: one list a field instead of one object a sheet, and a name that many sheets share
 * written once. Ten thousand sheets take a quarter less than rows do after compression, and half before.
 */

/** Records that belong to sheets, one list a field; sheet i has the next `of[i]` of them. */
type Lists<T> = { of: number[] } & { [K in keyof T]: T[K][] };

/** Places in `shared` stand for texts; null and 0 for what is not there. */
export interface PackedBook {
  version: 1;
  vocabulary: SearchBook['vocabulary'];
  engines: SearchBook['engines'];
  /** Texts that several sheets share. */
  shared: string[];
  sheets: {
    number: string[];
    letter: string[];
    publishedAt: string[];
    title: string[];
    summary: string[];
    minutes: number[];
    holds: number[];
    book: number[];
    system: number[];
    skill: number[];
  };
  /** Places of sheets that are withdrawn; left out where none is. */
  withdrawn?: number[];
  steps: Lists<{ title: string }>;
  engineOf: Lists<{ key: number }>;
  tools: Lists<{ name: number }>;
  parts: Lists<{ name: number; number: number | null }>;
  torques: Lists<{
    name: number;
    thread: number;
    nm: number;
    count: number;
    step: number;
    passes: number[];
    angles: number[];
  }>;
  limits: Lists<{
    name: number;
    quantity: number;
    unit: number | null;
    min: number | null;
    nominal: number | null;
    max: number | null;
    resolution: number | null;
    step: number;
  }>;
  timers: Lists<{ name: number; minutes: number; step: number }>;
}

function packLists<T extends Record<string, unknown>>(lists: T[][], fields: (keyof T)[]): Lists<T> {
  const all = lists.flat();
  const columns = Object.fromEntries(fields.map((field) => [field, all.map((record) => record[field])]));
  return { of: lists.map((list) => list.length), ...columns } as Lists<T>;
}

/** Hands out the records of one sheet after another. */
function unpackLists<T extends Record<string, unknown>, Out>(
  lists: Lists<T>,
  make: (record: T) => Out,
): (sheet: number) => Out[] {
  const { of, ...columns } = lists;
  const fields = Object.entries(columns as Record<string, unknown[]>);
  let from = 0;
  const starts = of.map((length) => {
    from += length;
    return from - length;
  });
  return (sheet) =>
    Array.from({ length: of[sheet] ?? 0 }, (_, i) => {
      const at = (starts[sheet] ?? 0) + i;
      return make(Object.fromEntries(fields.map(([name, column]) => [name, column[at]])) as T);
    });
}

export function packBook({ documents, vocabulary, engines }: SearchBook): PackedBook {
  const shared: string[] = [];
  const places = new Map<string, number>();
  const at = (text: string): number => {
    const known = places.get(text);
    if (known !== undefined) return known;
    places.set(text, shared.length);
    return shared.push(text) - 1;
  };
  const maybe = (text: string | null): number | null => (text === null ? null : at(text));
  const column = <T>(of: (document: SearchDocument) => T): T[] => documents.map(of);
  const packed = {
    sheets: {
      number: column((d) => d.number),
      letter: column((d) => d.letter),
      publishedAt: column((d) => d.publishedAt),
      title: column((d) => d.title),
      summary: column((d) => d.summary),
      minutes: column((d) => d.minutes),
      holds: column((d) => d.holds),
      book: column((d) => at(d.book)),
      system: column((d) => at(d.system)),
      skill: column((d) => at(d.skill)),
    },
    steps: packLists(
      column((d) => d.steps.map((title) => ({ title }))),
      ['title'],
    ),
    engineOf: packLists(
      column((d) => d.engines.map((key) => ({ key: at(key) }))),
      ['key'],
    ),
    tools: packLists(
      column((d) => d.tools.map((name) => ({ name: at(name) }))),
      ['name'],
    ),
    parts: packLists(
      column((d) => d.parts.map((part) => ({ name: at(part.name), number: maybe(part.number) }))),
      ['name', 'number'],
    ),
    torques: packLists(
      column((d) => d.torques.map((t) => ({ ...t, name: at(t.name), thread: at(t.thread), step: t.step ?? 0 }))),
      ['name', 'thread', 'nm', 'count', 'step', 'passes', 'angles'],
    ),
    limits: packLists(
      column((d) =>
        d.limits.map((l) => ({
          ...l,
          name: at(l.name),
          quantity: at(l.quantity),
          unit: maybe(l.unit),
          step: l.step ?? 0,
        })),
      ),
      ['name', 'quantity', 'unit', 'min', 'nominal', 'max', 'resolution', 'step'],
    ),
    timers: packLists(
      column((d) => d.timers.map((t) => ({ ...t, name: at(t.name), step: t.step ?? 0 }))),
      ['name', 'minutes', 'step'],
    ),
  };
  const withdrawn = documents.flatMap((document, place) => (document.withdrawn ? [place] : []));
  return { version: 1, vocabulary, engines, shared, ...packed, ...(withdrawn.length > 0 && { withdrawn }) };
}

export function unpackBook(packed: PackedBook): SearchBook {
  const text = (place: number): string => packed.shared[place] ?? '';
  const maybe = (place: number | null): string | null => (place === null ? null : text(place));
  const step = (number: number): number | null => (number === 0 ? null : number);
  const { sheets } = packed;
  const steps = unpackLists(packed.steps, ({ title }) => title);
  const enginesOf = unpackLists(packed.engineOf, ({ key }) => text(key));
  const tools = unpackLists(packed.tools, ({ name }) => text(name));
  const parts = unpackLists(packed.parts, (part) => ({ name: text(part.name), number: maybe(part.number) }));
  const torques = unpackLists(packed.torques, (t) => ({
    ...t,
    name: text(t.name),
    thread: text(t.thread),
    step: step(t.step),
  }));
  const limits = unpackLists(packed.limits, (l) => ({
    ...l,
    name: text(l.name),
    quantity: text(l.quantity) as SearchDocument['limits'][number]['quantity'],
    unit: maybe(l.unit),
    step: step(l.step),
  }));
  const timers = unpackLists(packed.timers, (t) => ({ ...t, name: text(t.name), step: step(t.step) }));
  const withdrawn = new Set(packed.withdrawn);
  const documents = sheets.number.map((number, i): SearchDocument => {
    const of = <T>(column: readonly T[]): T => column[i] as T;
    return {
      number,
      letter: of(sheets.letter),
      publishedAt: of(sheets.publishedAt),
      title: of(sheets.title),
      summary: of(sheets.summary),
      minutes: of(sheets.minutes),
      holds: of(sheets.holds),
      book: text(of(sheets.book)),
      ...(withdrawn.has(i) && { withdrawn: true }),
      system: text(of(sheets.system)) as SearchDocument['system'],
      skill: text(of(sheets.skill)) as SearchDocument['skill'],
      engines: enginesOf(i),
      steps: steps(i),
      tools: tools(i),
      parts: parts(i),
      torques: torques(i),
      limits: limits(i),
      timers: timers(i),
    };
  });
  return { documents, vocabulary: packed.vocabulary, engines: packed.engines };
}
