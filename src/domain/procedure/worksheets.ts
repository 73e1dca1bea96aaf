import { WORKSHEETS as REGISTERED } from '../worksheets/registry';

/** A table of readings to write down, each beside its limit; computes nothing. */
export const READINGS = 'readings';

const TITLES: ReadonlyMap<string, string> = new Map([
  [READINGS, 'Readings'],
  ...REGISTERED.map(({ name, title }) => [name, title] as const),
]);

/** Kinds that a step may ask for, in the order of the handbook. */
export const WORKSHEET_KINDS: readonly string[] = [...TITLES.keys()];

/** What a worksheet is called on a sheet; undefined for a kind that there is not. */
export const worksheetTitle = (kind: string | undefined): string | undefined =>
  kind === undefined ? undefined : TITLES.get(kind);
