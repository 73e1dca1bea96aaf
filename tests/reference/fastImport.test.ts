import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { fastImportStream, type Commit } from '@/domain/export/git/fastImport';

/** What our stream means to git itself: whatever is in names, messages, paths and texts comes back as it went in. */

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'matchmark-import-'));
  execFileSync('git', ['init', '-q', '--bare', folder]);
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));
const git = (args: string[], input?: string): Buffer =>
  execFileSync('git', ['-C', folder, ...args], { input, stdio: ['pipe', 'pipe', 'pipe'], maxBuffer: 1 << 26 });

const hostile = fc.string({
  unit: fc.oneof(
    fc.constantFrom('<', '>', '"', '\\', '\n', '\r', '\t', ' ', 'é', '🔧', ':', 'data 3', 'commit ', "'", '\u0001'),
    fc.string({ unit: 'grapheme', minLength: 1, maxLength: 1 }),
  ),
  maxLength: 12,
});
const part = hostile
  .map((name) => name.replaceAll('/', '_').replaceAll('\0', ''))
  .filter((name) => name !== '' && !/^\.+$|\.git|^\.|~\d/iu.test(name));
const ident = fc.record({
  name: hostile,
  email: hostile,
  at: fc
    .date({ min: new Date('2001-01-01'), max: new Date('2037-01-01'), noInvalidDate: true })
    .map((date) => date.toISOString()),
});
const commits = fc.array(
  fc.record({
    author: ident,
    committer: ident,
    message: hostile.map((text) => `${text}\n`),
    changes: fc
      .tuple(part, part, hostile)
      .map(([a, b, content]) => [{ kind: 'write' as const, path: `${a}/${b}`, content }]),
    tags: fc.constant([] as string[]),
  }),
  { minLength: 1, maxLength: 6 },
);

const made = fc.sample(commits, { numRuns: 40, seed: 20261201 });

test.each(made.map((one, i): [number, Commit[]] => [i, one]))('history %i', (_, history) => {
  const tagged = history.map((one, i) => ({ ...one, tags: [`t/${i}`] }));
  git(['fast-import', '--quiet', '--done'], fastImportStream(tagged));
  expect(git(['fsck', '--strict', '--no-dangling']).toString()).toBe('');
  expect(git(['rev-list', '--count', 'main']).toString().trim()).toBe(String(history.length));
  tagged.forEach(({ message, changes, author, committer }, i) => {
    const raw = git(['cat-file', 'commit', `t/${i}`]).toString();
    expect(raw.slice(raw.indexOf('\n\n') + 2)).toBe(message);
    const [change] = changes;
    if (change?.kind !== 'write') throw new Error('Each commit writes a file.');
    expect(git(['cat-file', 'blob', `t/${i}:${change.path}`]).toString()).toBe(change.content);
    const [at, by] = git(['log', '-1', '--format=%at %ct', `t/${i}`])
      .toString()
      .trim()
      .split(' ')
      .map(Number);
    expect([at, by]).toEqual([author.at, committer.at].map((time) => Math.floor(Date.parse(time) / 1000)));
  });
});
