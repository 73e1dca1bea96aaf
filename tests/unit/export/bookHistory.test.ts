import { expect, test } from 'vitest';
import { addressesOf, commitsOf, type Publication } from '@/domain/export/git/bookHistory';

const who = (id: string, name = `Person ${id}`) => ({ id, name, email: `${id}@real.example` });
const published = (given: Partial<Publication> = {}): Publication => ({
  kind: 'published',
  at: '2026-02-01T00:00:00.000Z',
  number: 'P-0142',
  letter: 'A',
  title: 'Reseal the valve cover',
  reason: 'It wept',
  by: who('2'),
  author: who('1'),
  proposedAt: '2026-01-31T00:00:00.000Z',
  reviewers: ['Ines Okafor', 'Tobias'],
  overrides: [],
  revisionId: 'r',
  source: 'text',
  hash: '7f3a91c0ffff',
  ...given,
});

test('a commit says who wrote it and when, who published it and when, and why', () => {
  const [commit] = commitsOf([
    published({ overrides: [{ torque: 'Head bolt', person: 'Ines', reason: 'Yield bolt,\nby the maker' }] }),
  ]);
  expect(commit?.author).toEqual({ name: 'Person 1', email: 'person-1@book.invalid', at: '2026-01-31T00:00:00.000Z' });
  expect(commit?.committer).toEqual({
    name: 'Person 2',
    email: 'person-2@book.invalid',
    at: '2026-02-01T00:00:00.000Z',
  });
  expect(commit?.message).toBe(`P-0142 A, Reseal the valve cover

It wept

Reviewed-by: Ines Okafor
Reviewed-by: Tobias
Overrides: Head bolt, by Ines: Yield bolt, by the maker
Revision: A
Sheet-check: 7f3a91c0
Procedure: P-0142
`);
});

test('the file keeps its first name when the title changes; a withdrawal deletes it and a bringing back restores it', () => {
  const path = 'content/procedures/p-0142-reseal-the-valve-cover.mdx';
  const told = { number: 'P-0142', letter: 'B', title: 'Other title', reason: 'Doubt', by: who('2') };
  const commits = commitsOf([
    published(),
    published({ letter: 'B', title: 'Other title', source: 'second', at: '2026-02-02T00:00:00.000Z' }),
    { ...told, kind: 'withdrawn', at: '2026-02-03T00:00:00.000Z' },
    { ...told, kind: 'brought back', at: '2026-02-04T00:00:00.000Z' },
  ]);
  expect(commits.map(({ changes }) => changes)).toEqual([
    [{ kind: 'write', path, content: 'text' }],
    [{ kind: 'write', path, content: 'second' }],
    [{ kind: 'delete', path }],
    [{ kind: 'write', path, content: 'second' }],
  ]);
  expect(commits.map(({ tags }) => tags)).toEqual([['P-0142/A'], ['P-0142/B'], [], []]);
  expect(commits[2]?.message).toContain(
    'P-0142 B, Other title: withdrawn\n\nDoubt\n\nRevision: B\nProcedure: P-0142\n',
  );
});

test('addresses lead nowhere unless asked for, and two people of one name keep apart', () => {
  const people = [who('2', 'Ann Ø'), who('1', 'Ann O'), { id: '3', name: '☃', email: null }];
  const made = people.map(addressesOf(people, false));
  expect(made).toEqual(['ann-o-2@book.invalid', 'ann-o@book.invalid', 'nobody@book.invalid']);
  expect(people.map(addressesOf(people, true))).toEqual(['2@real.example', '1@real.example', 'nobody@book.invalid']);
});
