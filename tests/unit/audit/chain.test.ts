import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BEFORE_THE_FIRST, breaksAt, type Break, type ChainedLink, type Link } from '@/domain/audit/chain';
import { breakFault, faultSentence } from '@/domain/audit/fault';
import { differences } from '@/domain/audit/differences';

interface Entry extends ChainedLink {
  words: string;
}
const hashed = ({ previousHash, words }: Pick<Entry, 'previousHash' | 'words'>) =>
  createHash('sha256').update(previousHash).update('\n').update(words).digest('hex');

function trail(words: readonly string[]): Entry[] {
  let before = '';
  return words.map((text, i) => {
    const entry = { seq: i + 1, words: text, previousHash: before, hash: '' };
    entry.hash = hashed(entry);
    before = entry.hash;
    return entry;
  });
}

function breaksOf(entries: readonly Entry[]): Break[] {
  let before: Link = BEFORE_THE_FIRST;
  return entries.flatMap((entry) => {
    const found = breaksAt(before, entry, hashed(entry));
    before = entry;
    return found;
  });
}

const words = fc.array(fc.string({ maxLength: 6 }), { minLength: 2, maxLength: 30 });

describe('the chain', () => {
  it('holds as it was written', () => {
    fc.assert(
      fc.property(words, (all) => {
        expect(breaksOf(trail(all))).toEqual([]);
      }),
    );
  });

  it('names the one entry whose words were changed, wherever it stands', () => {
    fc.assert(
      fc.property(words, fc.nat(), (all, at) => {
        const entries = trail(all);
        const one = entries[at % entries.length]!;
        one.words += '!';
        expect(breaksOf(entries)).toEqual([{ kind: 'changed', seq: one.seq }]);
      }),
    );
  });

  it('names an entry that was made anew with its hash, but for the last one, which nothing follows', () => {
    fc.assert(
      fc.property(words, fc.nat(), (all, at) => {
        const entries = trail(all);
        const one = entries[at % entries.length]!;
        one.words += '!';
        one.hash = hashed(one);
        const isLast = one.seq === entries.length;
        expect(breaksOf(entries)).toEqual(isLast ? [] : [{ kind: 'replaced', seq: one.seq }]);
      }),
    );
  });

  it('names a run of entries that was taken out, but for the end, which only a checkpoint knows', () => {
    fc.assert(
      fc.property(words, fc.nat(), fc.nat(), (all, a, b) => {
        const entries = trail(all);
        const from = a % entries.length;
        const until = from + 1 + (b % (entries.length - from));
        entries.splice(from, until - from);
        const gone = until === all.length ? [] : [{ kind: 'missing', seq: from + 1, through: until }];
        expect(breaksOf(entries)).toEqual(gone);
      }),
    );
  });

  it('finds a false beginning', () => {
    const [first] = trail(['one']);
    const forged = { ...first!, previousHash: 'f'.repeat(64) };
    forged.hash = hashed(forged);
    expect(breaksOf([forged])).toEqual([{ kind: 'changed', seq: 1 }]);
  });
});

describe('a fault in words', () => {
  const day = () => '3 Mar 2026';
  const about = { at: '2026-03-03T08:00:00.000Z', number: 'P-0142', letter: 'C' };
  it.each([
    [
      breakFault({ kind: 'changed', seq: 12 }, about),
      'The entry of 3 Mar 2026 about P-0142 revision C was changed after it was written.',
    ],
    [
      breakFault({ kind: 'missing', seq: 12, through: 14 }, { at: null, number: null, letter: null }),
      'The entries 12 to 14 of the trail are missing.',
    ],
    [
      { table: 'agreements' as const, id: 'x', ...about, differs: ['is there, but the trail does not tell of it'] },
      'An agreement to P-0142 revision C is there, but the trail does not tell of it.',
    ],
  ])('reads', (fault, sentence) => {
    expect(faultSentence(fault, day)).toBe(sentence);
  });

  it('tells what differs, and asks only what the trail tells', () => {
    expect(
      differences({
        letter: ['B', 'C'],
        hash: ['a'.repeat(64), 'b'.repeat(64)],
        reason: ['x', undefined],
        same: [1, 1],
      }),
    ).toEqual([
      'has “B” for its letter where the trail says “C”',
      'has aaaaaaaa for its hash where the trail says bbbbbbbb',
    ]);
  });
});
