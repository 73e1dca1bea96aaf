import fc from 'fast-check';
import { expect, test } from 'vitest';
import { returnPath } from '@/server/accounts/returnPath';

test.each([
  ['/procedures/P-0142?units=inch#step-cool', '/procedures/P-0142?units=inch#step-cool'],
  ['/', '/'],
  [null, '/'],
  ['', '/'],
  ['procedures', '/'],
  ['https://other.test/', '/'],
  ['//other.test/', '/'],
  ['/\\other.test/', '/'],
  ['/\t/other.test/', '/'],
  ['/..//other.test', '/'],
  ['/a\\b', '/'],
  ['javascript:alert(1)', '/'],
  ['/sign-in?to=/sign-in', '/'],
  ['/api/auth/signout', '/'],
])('%j goes to %j', (wanted, path) => expect(returnPath(wanted)).toBe(path));

test('whatever is wanted, the browser stays on this site', () => {
  const hostile = fc
    .array(fc.constantFrom('/', '\\', '.', '%', '\t', '\n', ':', '@', '?', '#', 'a', 'other.test'))
    .map((p) => p.join(''));
  fc.assert(
    fc.property(fc.oneof(hostile, fc.string()), (wanted) => {
      expect(new URL(returnPath(wanted), 'https://book.test').origin).toBe('https://book.test');
    }),
    { numRuns: 2000 },
  );
});
