/** An engine as a sheet names it. */
export interface EngineName {
  key: string;
  name: string;
  years?: { from: number; to: number };
}

/** Names for the keys a front matter lists; an engine the network has not described keeps its key. */
export const namesOf = (keys: readonly string[], known: readonly EngineName[]): EngineName[] =>
  keys.map((key) => known.find((engine) => engine.key === key) ?? { key, name: key });

/** Names by key, for a text that names engines by theirs. */
export const engineNames = (known: readonly EngineName[]): ReadonlyMap<string, string> =>
  new Map(known.map(({ key, name }) => [key, name]));
