import type { SearchBook } from './engine';
import type { SearchDocument } from './documents';

/**
 * How a book crosses the wire: one list a field instead of one object a sheet, and a name that many sheets share
 * written once. Ten thousand sheets take half of what rows take, before and after compression.
 */
export interface PackedBook {
  version: 1;
  vocabulary: SearchBook['vocabulary'];
  engines: SearchBook['engines'];
  /** Texts that several sheets share; the lists below hold places in it. */
  shared: string[];
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
  engine: number[][];
  steps: string[][];
  tools: number[][];
  /** Name and number in turn; -1 for no number. */
  parts: number[][];
  /** Name, thread, N·m, count, step (0 for none), passes and angles of each torque in turn. */
  torques: (number | number[])[][];
  /** Name, quantity, unit, min, nominal, max and step of each limit in turn. */
  limits: (number | null)[][];
  /** Name, minutes and step of each timer in turn. */
  timers: (number | null)[][];
}

class Shared {
  readonly texts: string[] = [];
  readonly #places = new Map<string, number>();

  at = (text: string): number => {
    const known = this.#places.get(text);
    if (known !== undefined) return known;
    this.#places.set(text, this.texts.length);
    return this.texts.push(text) - 1;
  };
}

export function packBook({ documents, vocabulary, engines }: SearchBook): PackedBook {
  const shared = new Shared();
  const { at } = shared;
  const column = <T>(of: (document: SearchDocument) => T): T[] => documents.map(of);
  const columns = {
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
    engine: column((d) => d.engines.map(at)),
    steps: column((d) => d.steps),
    tools: column((d) => d.tools.map(at)),
    parts: column((d) => d.parts.flatMap((part) => [at(part.name), part.number === null ? -1 : at(part.number)])),
    torques: column((d) =>
      d.torques.flatMap((t) => [at(t.name), at(t.thread), t.nm, t.count, t.step ?? 0, t.passes, t.angles]),
    ),
    limits: column((d) =>
      d.limits.flatMap((l) => [
        at(l.name),
        at(l.quantity),
        l.unit === null ? null : at(l.unit),
        l.min,
        l.nominal,
        l.max,
        l.step,
      ]),
    ),
    timers: column((d) => d.timers.flatMap((t) => [at(t.name), t.minutes, t.step])),
  };
  return { version: 1, vocabulary, engines, shared: shared.texts, ...columns };
}

/** Cuts a flat list into its records of `size`. */
function records<T>(flat: readonly T[], size: number): T[][] {
  const out: T[][] = [];
  for (let i = 0; i < flat.length; i += size) out.push(flat.slice(i, i + size));
  return out;
}

export function unpackBook(packed: PackedBook): SearchBook {
  const text = (place: unknown): string => packed.shared[place as number] ?? '';
  const number = (value: unknown): number | null => (typeof value === 'number' ? value : null);
  const documents = packed.number.map((name, i): SearchDocument => {
    const of = <T>(column: readonly T[]): T => column[i] as T;
    return {
      number: name,
      letter: of(packed.letter),
      publishedAt: of(packed.publishedAt),
      title: of(packed.title),
      summary: of(packed.summary),
      minutes: of(packed.minutes),
      holds: of(packed.holds),
      book: text(of(packed.book)),
      system: text(of(packed.system)) as SearchDocument['system'],
      skill: text(of(packed.skill)) as SearchDocument['skill'],
      engines: of(packed.engine).map(text),
      steps: of(packed.steps),
      tools: of(packed.tools).map(text),
      parts: records(of(packed.parts), 2).map(([part, no]) => ({
        name: text(part),
        number: no === -1 ? null : text(no),
      })),
      torques: records(of(packed.torques), 7).map(([torque, thread, nm, count, step, passes, angles]) => ({
        name: text(torque),
        thread: text(thread),
        nm: nm as number,
        count: count as number,
        step: step === 0 ? null : number(step),
        passes: passes as number[],
        angles: angles as number[],
      })),
      limits: records(of(packed.limits), 7).map(([limit, quantity, unit, min, nominal, max, step]) => ({
        name: text(limit),
        quantity: text(quantity) as SearchDocument['limits'][number]['quantity'],
        unit: unit === null ? null : text(unit),
        min: number(min),
        nominal: number(nominal),
        max: number(max),
        step: number(step),
      })),
      timers: records(of(packed.timers), 3).map(([timer, minutes, step]) => ({
        name: text(timer),
        minutes: minutes as number,
        step: number(step),
      })),
    };
  });
  return { documents, vocabulary: packed.vocabulary, engines: packed.engines };
}
