import { expect, it } from 'vitest';
import { readDraft } from '@/domain/writing/readDraft';

it('does not read a front matter of thousands of names, which would hold everybody up', () => {
  const many = Array.from({ length: 12_000 }, (_, i) => `a${i}:`).join('\n');
  const from = performance.now();
  expect(readDraft(`---\n${many}\n---\n`)).toBeNull();
  // A reader of YAML compares each with all before it: seconds, where counting them takes a moment.
  expect(performance.now() - from).toBeLessThan(300);
});
