import { describe, expect, test } from 'vitest';
import { releaseStep } from '@/domain/revision/release';

describe('a text that a release ships', () => {
  test.each([
    ['is new', { shipped: '1', before: null, current: null }, 'add'],
    ['is what the book has', { shipped: '1', before: '1', current: '1' }, 'none'],
    ['was already there under its number', { shipped: '1', before: null, current: '1' }, 'none'],
    ['is the same as last time, and the book went on', { shipped: '1', before: '1', current: '2' }, 'none'],
    ['changed, and the book stood still', { shipped: '2', before: '1', current: '1' }, 'revise'],
    ['changed, and so did the book', { shipped: '3', before: '1', current: '2' }, 'propose'],
    ['changed to what the book came to by itself', { shipped: '2', before: '1', current: '2' }, 'none'],
    ['meets another procedure under its number', { shipped: '1', before: null, current: '2' }, 'propose'],
  ] as const)('%s', (_, facts, step) => expect(releaseStep({ ...facts, fails: false })).toBe(step));

  // What nobody reviews must not bring a torque past proof load into the book.
  test.each([
    ['is new', { shipped: '1', before: null, current: null }, 'refuse'],
    ['changed, and the book stood still', { shipped: '2', before: '1', current: '1' }, 'propose'],
    ['changed, and so did the book', { shipped: '3', before: '1', current: '2' }, 'propose'],
    ['is what the book has', { shipped: '1', before: '1', current: '1' }, 'none'],
    ['is the same as last time, and the book went on', { shipped: '1', before: '1', current: '2' }, 'none'],
  ] as const)('and fails the clamp check: %s', (_, facts, step) =>
    expect(releaseStep({ ...facts, fails: true })).toBe(step),
  );
});
