import { expect } from 'vitest';
import type { Worked } from '@/domain/measure/worked';

type Path = string[];

/** Every number and every list inside an input, by its path. */
function places(value: unknown, path: Path = []): { numbers: Path[]; lists: Path[] } {
  if (typeof value === 'number') return { numbers: [path], lists: [] };
  if (typeof value !== 'object' || value === null) return { numbers: [], lists: [] };
  const inside = Object.entries(value).map(([key, child]) => places(child, [...path, key]));
  return {
    numbers: inside.flatMap((one) => one.numbers),
    lists: [...(Array.isArray(value) ? [path] : []), ...inside.flatMap((one) => one.lists)],
  };
}

/** The input with something else at one path. */
function withPut<T>(input: T, path: Path, put: (old: unknown) => unknown): T {
  const [first, ...rest] = path;
  if (first === undefined) return put(input) as T;
  const copy = (Array.isArray(input) ? [...input] : { ...input }) as Record<string, unknown>;
  copy[first] = withPut(copy[first], rest, put);
  return copy as T;
}

const finiteEverywhere = (value: unknown): boolean =>
  typeof value === 'number'
    ? Number.isFinite(value)
    : typeof value !== 'object' || value === null || Object.values(value).every(finiteEverywhere);

/** Answers without a number that is none, or says which field is wrong in a whole sentence. */
export function expectSound(result: Worked<unknown>): void {
  if (result.ok) return void expect(finiteEverywhere(result.value), JSON.stringify(result.value)).toBe(true);
  expect(result.problems.length).toBeGreaterThan(0);
  for (const { field, message } of result.problems) {
    expect(field).not.toBe('');
    expect(message).toMatch(/^[A-Z].* .*\.$/);
    expect(message).not.toMatch(/NaN|undefined|Infinity|object/);
  }
}

const NO_NUMBERS = [NaN, Infinity, -Infinity, '5', null];
const ENORMOUS = [1e308, -1e308, 1e12];
const ODD = [0, -0, -1, 5e-324, 1e-300];

interface Loose {
  /** Paths of lists that may be empty or missing. */
  lists?: string[];
  /** Paths of numbers that may be null. */
  nulls?: string[];
}

/**
 * Puts what is no number, and what is enormous, in the place of every number of a good input, one at a time: each must be
 * refused and the field named. Puts 0, −1 and the smallest number there is in its place, empties, shortens, lengthens and
 * replaces every list: it must not throw, and never answer with a number that is none.
 */
export function sweep<I>(compute: (input: I) => Worked<unknown>, good: I, loose: Loose = {}): void {
  expect(compute(good)).toMatchObject({ ok: true });
  const { numbers, lists } = places(good);
  expect(numbers.length).toBeGreaterThan(0);

  const refusedWith = (path: Path, value: unknown) => {
    const result = compute(withPut(good, path, () => value));
    expect(result.ok, `${path.join('.')} was let through as ${JSON.stringify(value)}`).toBe(false);
    expectSound(result);
    return result.ok ? [] : result.problems.map(({ field }) => field);
  };

  for (const path of numbers) {
    const name = path.join('.');
    for (const bad of [...NO_NUMBERS, ...ENORMOUS])
      if (bad !== null || !loose.nulls?.includes(name)) expect(refusedWith(path, bad)).toContain(name);
    for (const odd of ODD) expectSound(compute(withPut(good, path, () => odd)));
  }
  for (const path of lists) {
    const first = (old: unknown) => (old as unknown[])[0];
    expectSound(compute(withPut(good, path, (old) => (old as unknown[]).slice(1))));
    expectSound(compute(withPut(good, path, (old) => [...(old as unknown[]), first(old)])));
    const endless = compute(withPut(good, path, (old) => Array.from({ length: 5000 }, () => first(old))));
    expect(endless.ok, `${path.join('.')} was let through with 5000 entries`).toBe(false);
    expectSound(endless);
    if (loose.lists?.includes(path.join('.'))) continue;
    // A list of holes is what a spreadsheet with empty cells turns into.
    for (const bad of [[], 'list', undefined, Array(3)]) refusedWith(path, bad);
  }
}
