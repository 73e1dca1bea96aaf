import { SKILLS, SYSTEMS, type System } from '../procedure/schema';
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

/** The places with a score that pass the filters, in the order of the book, and the counts beside each choice. */
export function sift(
  documents: readonly SearchDocument[],
  scores: Float32Array,
  filters: Filters,
): { kept: number[]; facets: Facets } {
  const facets: Facets = { engine: {}, system: {}, fit: {} };
  const count = (counts: Record<string, number>, value: string): void => {
    counts[value] = (counts[value] ?? 0) + 1;
  };
  const engines = new Set(filters.engine);
  const systems = new Set<string>(filters.system);
  const skills = new Set<string>(filters.fit);
  const kept: number[] = [];
  documents.forEach((document, at) => {
    if (scores[at] === 0) return;
    const engine = engines.size === 0 || document.engines.some((one) => engines.has(one));
    const system = systems.size === 0 || systems.has(document.system);
    const fit = skills.size === 0 || skills.has(document.skill);
    if (system && fit) for (const one of document.engines) count(facets.engine, one);
    if (engine && fit) count(facets.system, document.system);
    if (engine && system) count(facets.fit, document.skill);
    if (engine && system && fit) kept.push(at);
  });
  return { kept, facets };
}
