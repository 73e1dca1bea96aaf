import { afterEach, beforeEach, expect, vi } from 'vitest';

// An error that nobody looks at is a bug nobody finds: a test fails on a console.error it did not expect.
// A test that provokes one on purpose spies on console.error itself.
beforeEach(() => {
  vi.spyOn(console, 'error');
});
afterEach(() => {
  const spy = vi.mocked(console.error);
  const calls = vi.isMockFunction(console.error) ? spy.mock.calls.map((call) => call.map(String).join(' ')) : [];
  vi.restoreAllMocks();
  expect(calls, 'unexpected console.error').toEqual([]);
});
