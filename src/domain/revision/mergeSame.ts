/** A value as one text, whatever the order of its fields; what is not set, `false` or empty is not there. */
export function rawOf(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(rawOf).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value ?? null);
  const set = Object.entries(value).filter(
    ([, v]) => v !== undefined && v !== null && v !== false && !(Array.isArray(v) && v.length === 0),
  );
  return `{${set
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, v]) => `${JSON.stringify(name)}:${rawOf(v)}`)
    .join(',')}}`;
}

export const same = (a: unknown, b: unknown): boolean => a === b || rawOf(a) === rawOf(b);

/** What one side or both alike made of a value; null where both changed it and not to the same. */
export function pick<T>(base: T, mine: T, theirs: T): { value: T } | null {
  if (same(mine, theirs) || same(base, theirs)) return { value: mine };
  return same(base, mine) ? { value: theirs } : null;
}
