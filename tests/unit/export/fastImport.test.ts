import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fastImportStream, quotedPath, type Commit } from '@/domain/export/git/fastImport';

const ROWAN = { name: 'Rowan', email: 'rowan@book.invalid', at: '2026-01-02T03:04:05.678Z' };
const commit = (given: Partial<Commit> = {}): Commit => ({
  author: ROWAN,
  committer: { ...ROWAN, at: '2026-01-03T00:00:00.000Z' },
  message: 'A reason\n',
  changes: [{ kind: 'write', path: 'a/b.mdx', content: 'text\n' }],
  tags: ['P-0142/A'],
  ...given,
});

test('the stream of two commits, as git-fast-import(1) describes it', () => {
  expect(fastImportStream([commit(), commit({ changes: [{ kind: 'delete', path: 'a/b.mdx' }], tags: [] })])).toBe(
    `commit refs/heads/main
mark :1
author Rowan <rowan@book.invalid> 1767323045 +0000
committer Rowan <rowan@book.invalid> 1767398400 +0000
data 9
A reason

M 100644 inline a/b.mdx
data 5
text

reset refs/tags/P-0142/A
from :1

commit refs/heads/main
mark :2
author Rowan <rowan@book.invalid> 1767323045 +0000
committer Rowan <rowan@book.invalid> 1767398400 +0000
data 9
A reason

from :1
D a/b.mdx
done
`,
  );
});

describe('lengths', () => {
  test('are counted in bytes, not in characters', () => {
    expect(fastImportStream([commit({ message: '10 N·m ±1, 🔧\n' })])).toContain('data 18\n10 N·m ±1, 🔧\n');
  });
  test('name the very end of any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (content) => {
        const stream = Buffer.from(
          fastImportStream([commit({ message: 'm\n', changes: [{ kind: 'write', path: 'x', content }], tags: [] })]),
        );
        const at = stream.indexOf('inline x\ndata ') + 'inline x\ndata '.length;
        const end = stream.indexOf('\n', at);
        const length = Number(stream.subarray(at, end).toString());
        expect(stream.subarray(end + 1, end + 1 + length).toString()).toBe(content);
        expect(stream.subarray(end + 1 + length).toString()).toBe('\ndone\n');
      }),
    );
  });
});

describe('people', () => {
  test.each([
    ['Ann <ann@real.example>', 'Ann ‹ann@real.example›'],
    ['Two\nlines', 'Two lines'],
    ['  ', 'Nobody named'],
    ['Søren Ærø', 'Søren Ærø'],
  ])('%j is written as %j', (name, written) => {
    const stream = fastImportStream([commit({ author: { ...ROWAN, name } })]);
    expect(stream).toContain(`author ${written} <rowan@book.invalid> `);
  });
  test('an address cannot end itself early', () => {
    const stream = fastImportStream([commit({ author: { ...ROWAN, email: 'a>\nb <c@d' } })]);
    expect(stream).toContain('author Rowan <abc@d> ');
  });
});

describe('paths', () => {
  test.each([
    ['content/procedures/p-0142.mdx', 'content/procedures/p-0142.mdx'],
    ['with space/ærø', 'with space/ærø'],
    ['a"b\\c', '"a\\"b\\\\c"'],
    ['line\nend', '"line\\012end"'],
  ])('%j is written %j', (path, written) => expect(quotedPath(path)).toBe(written));
  test.each(['../up', '/root', 'a//b', 'a/./b', ''])('%j is refused', (path) =>
    expect(() => quotedPath(path)).toThrow(RangeError),
  );
});
