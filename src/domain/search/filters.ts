import { SKILLS, SYSTEMS, type System } from '../procedure/systems';
import type { SearchDocument } from './documents';

/** What the list is narrowed to. Within one filter any of the values will do; the filters are all held to. */
export interface Filters {
  engine: readonly string[];
  system: readonly System[];
  fit: readonly SearchDocument['skill'][];
}

/** How many sheets each choice would show, the other filters staying as they are. */
export type Facets = Record<keyof Filters, Record<string, number>>;

export const NO_FILTERS: Filters = { engine: [], system: [], fit: [] };

const chosen = <T extends string>(texts: readonly string[], known: readonly T[]): T[] =>
  known.filter((one) => texts.includes(one));

/** Reads filters from the parameters of an address; what is unknown is left out. */
export function readFilters(parameters: URLSearchParams, engines: readonly string[]): Filters {
  const all = (name: string): string[] => parameters.getAll(name).flatMap((text) => text.split(','));
  return {
    engine: chosen(all('engine'), engines),
    system: chosen(all('system'), Object.keys(SYSTEMS) as System[]),
    fit: chosen(all('fit'), SKILLS),
  };
}

export const isFiltered = (filters: Filters): boolean =>
  filters.engine.length + filters.system.length + filters.fit.length > 0;

/** What the filters look at, as flat lists: counting ten thousand sheets by name costs more than finding them. */
export class Sieve {
  readonly #names: Record<keyof Filters, string[]>;
  /** Place of a sheet's values in `names`. A sheet may have several engines: sheet i has those from `starts[i]` to `starts[i + 1]`. */
  readonly #starts: Uint32Array;
  readonly #engines: Uint16Array;
  readonly #systems: Uint16Array;
  readonly #fits: Uint16Array;

  constructor(documents: readonly SearchDocument[]) {
    const engines = [...new Set(documents.flatMap((document) => document.engines))];
    const placeOf = new Map(engines.map((name, place) => [name, place]));
    const systems = Object.keys(SYSTEMS);
    this.#names = { engine: engines, system: systems, fit: [...SKILLS] };
    this.#starts = new Uint32Array(documents.length + 1);
    documents.forEach((document, at) => {
      this.#starts[at + 1] = (this.#starts[at] as number) + document.engines.length;
    });
    this.#engines = Uint16Array.from(
      documents.flatMap((document) => document.engines),
      (name) => placeOf.get(name) ?? 0,
    );
    this.#systems = Uint16Array.from(documents, (document) => systems.indexOf(document.system));
    this.#fits = Uint16Array.from(documents, (document) => SKILLS.indexOf(document.skill));
  }

  /** The places with a score that pass the filters, in the order of the book, and the counts beside each choice. */
  sift(scores: Float32Array, filters: Filters): { kept: number[]; facets: Facets } {
    const wanted = (name: keyof Filters): Uint8Array => {
      const chosen = filters[name] as readonly string[];
      return Uint8Array.from(this.#names[name], (value) => (chosen.length === 0 || chosen.includes(value) ? 1 : 0));
    };
    const [engines, systems, fits] = [wanted('engine'), wanted('system'), wanted('fit')];
    const counts = {
      engine: new Uint32Array(engines.length),
      system: new Uint32Array(systems.length),
      fit: new Uint32Array(fits.length),
    };
    const kept: number[] = [];
    for (let at = 0; at < scores.length; at += 1) {
      if (scores[at] === 0) continue;
      const [from, to] = [this.#starts[at] as number, this.#starts[at + 1] as number];
      const system = this.#systems[at] as number;
      const fit = this.#fits[at] as number;
      let engineFits = filters.engine.length === 0 ? 1 : 0;
      for (let i = from; i < to; i += 1) engineFits |= engines[this.#engines[i] as number] as number;
      const systemFits = systems[system] as number;
      const fitFits = fits[fit] as number;
      if (systemFits & fitFits)
        for (let i = from; i < to; i += 1) (counts.engine[this.#engines[i] as number] as number)++;
      if (engineFits & fitFits) (counts.system[system] as number)++;
      if (engineFits & systemFits) (counts.fit[fit] as number)++;
      if (engineFits & systemFits & fitFits) kept.push(at);
    }
    const named = (name: keyof Filters): Record<string, number> =>
      Object.fromEntries(this.#names[name].flatMap((value, i) => (counts[name][i] ? [[value, counts[name][i]]] : [])));
    return { kept, facets: { engine: named('engine'), system: named('system'), fit: named('fit') } };
  }
}
