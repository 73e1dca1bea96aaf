import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { keepOverride, keptOverride } from '@/components/review/keptOverride';

let stored: Map<string, string>;
beforeEach(() => {
  stored = new Map();
  vi.stubGlobal('sessionStorage', {
    getItem: (key: string) => stored.get(key) ?? null,
    setItem: (key: string, value: string) => void stored.set(key, value),
    removeItem: (key: string) => void stored.delete(key),
  });
});
afterEach(() => vi.unstubAllGlobals());

it('gives back what was typed, for that torque of that proposal alone', () => {
  keepOverride('one', 'head-bolt', 'Stretch measured');
  expect(keptOverride('one', 'head-bolt')).toBe('Stretch measured');
  expect(keptOverride('one', 'rod-bolt')).toBe('');
  expect(keptOverride('two', 'head-bolt')).toBe('');
});

it('forgets it once it was taken, and never keeps blanks', () => {
  keepOverride('one', 'head-bolt', 'Stretch measured');
  keepOverride('one', 'head-bolt', '');
  keepOverride('one', 'rod-bolt', ' \n');
  expect(stored.size).toBe(0);
});

it('does without a storage that is forbidden', () => {
  vi.stubGlobal('sessionStorage', undefined);
  expect(() => keepOverride('one', 'head-bolt', 'Stretch')).not.toThrow();
  expect(keptOverride('one', 'head-bolt')).toBe('');
});
