import { expect } from 'vitest';
import type { Worked } from '@/domain/measure/worked';

/** Numbers that somebody's typing, or somebody's program, may hand in. */
export const BAD_NUMBERS = [NaN, Infinity, -Infinity, 0, -1, -1e308] as const;
export const EXTREMES = [...BAD_NUMBERS, 1e308, 5e-324, Number.MAX_SAFE_INTEGER] as const;
export const NO_NUMBERS = [undefined, null, '', '7', {}, [], true] as unknown as number[];
export const ODD_TEXTS = ['', ' ', '\0', '🔩', 'M', '—', 'x'.repeat(10_000), '__proto__', 'toString', '1/0'] as const;

function deepNumbers(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  return value !== null && typeof value === 'object' ? Object.values(value).flatMap(deepNumbers) : [];
}

/** What every measure function owes for any input: a value of finite numbers, or problems that name a field in a sentence. */
export function expectSound(result: Worked<unknown>, fields: RegExp): void {
  if (result.ok) {
    for (const number of deepNumbers(result.value)) expect(Number.isFinite(number)).toBe(true);
    return;
  }
  expect(result.problems.length).toBeGreaterThan(0);
  for (const { field, message } of result.problems) {
    expect(field).toMatch(fields);
    expect(message).toMatch(/^["#A-Z0-9][^]*\.$/);
    expect(message).not.toMatch(/NaN|undefined|Infinity|\[object/);
  }
}

/** A refusal that names this field. */
export function expectRefused(result: Worked<unknown>, field: string): void {
  expect(result.ok).toBe(false);
  expectSound(result, /./);
  if (!result.ok) expect(result.problems.map((problem) => problem.field)).toContain(field);
}
