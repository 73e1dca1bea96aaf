import { describe, expect, it } from 'vitest';
import { keepingWords } from '@/components/writing/keepingWords';
import { becameWords, whatWords } from '@/components/writing/versionWords';
import { VERSION_KINDS } from '@/domain/writing/versions';

describe('how it stands with a draft', () => {
  it.each([
    ['network', 'Kept on this device. Sent when the network is back.', 'Not kept: no network.'],
    [
      'signed out',
      'Kept on this device. You are signed out: sent when you sign in again.',
      'Not kept: you are signed out.',
    ],
    ['busy', 'Kept on this device. The book is busy: sent in a moment.', 'Not kept: the book is busy.'],
  ] as const)('without %s', (why, held, lost) => {
    const words = (onDevice: boolean) => keepingWords({ kind: 'unreachable', why, onDevice }, 0, 0);
    expect(words(true)).toBe(held);
    expect(words(false)).toBe(`${lost} This device cannot hold them: keep this page open.`);
  });
});

describe('what a version is', () => {
  it('is said for each kind but a mere save', () => {
    const said = VERSION_KINDS.map((kind) => becameWords({ kind, of: 4, base: 'C' }));
    expect(said.filter((words) => words === null)).toHaveLength(1);
    expect(said).toContain('Gone back to version 4');
    expect(becameWords({ kind: 'start', of: null, base: null })).toBe('Begun as a new procedure');
  });

  it('lists what changed, and counts what would be too long to read', () => {
    expect(whatWords([])).toBe('');
    expect(whatWords(['step 3 deleted', 'title changed'])).toBe('Step 3 deleted and title changed');
    expect(whatWords(['a', 'b', 'c', 'd', 'e', 'f'])).toBe('A, b, c and 3 more');
  });
});
