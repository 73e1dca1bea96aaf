/** Compares what a row says with what the trail says of it. */

const short = (value: unknown): string => {
  if (value === null || value === undefined || value === '') return 'nothing';
  const text = String(value);
  // A hash is told by the digits that are printed on a sheet.
  if (/^[0-9a-f]{64}$/.test(text)) return text.slice(0, 8);
  return text.length > 60 ? `“${text.slice(0, 57)}…”` : `“${text}”`;
};

/** One clause for each name whose two values differ; what the trail does not tell (undefined) is not asked about. */
export function differences(pairs: Record<string, readonly [is: unknown, told: unknown]>): string[] {
  return Object.entries(pairs).flatMap(([name, [is, told]]) =>
    told === undefined || (is ?? null) === (told ?? null)
      ? []
      : [`has ${short(is)} for its ${name} where the trail says ${short(told)}`],
  );
}

/** The same for a person, who is told by name; two of one name are told apart by their ids. */
export function otherPerson(is: Person, told: Person): string[] {
  if (told.id === null || is.id === told.id) return [];
  const [a, b] = is.name === told.name ? [is.id, told.id] : [is.name, told.name];
  return differences({ author: [a, b] });
}

interface Person {
  id: string | null;
  name: string | null;
}
