import type { SearchOptions } from '@/domain/search/engine';
import type { Matched } from '@/domain/search/explain';
import type { Filters } from '@/domain/search/filters';

export interface Ask {
  text: string;
  filters: Filters;
  limit: number;
  units: NonNullable<SearchOptions['units']>;
  inProse: [number: string, matched: Matched][];
}

export type ToWorker = { id: number } & (({ kind: 'ask' } & Ask) | { kind: 'load'; person: string });
export type FromWorker = { id: number } & ({ ok: true; value: unknown } | { ok: false; why: string });
