import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foldSteps, oldOrder, type Section } from '@/domain/revision/folding';

interface Pair {
  id: string;
  kind: 'same' | 'edited' | 'added' | 'removed';
  moved: boolean;
  old: { number: number } | null;
  now: { number: number } | null;
}

const pair = (id: string, old: number | null, now: number | null, change: Partial<Pair> = {}): Pair => ({
  id,
  kind: old === null ? 'added' : now === null ? 'removed' : 'same',
  moved: false,
  old: old === null ? null : { number: old },
  now: now === null ? null : { number: now },
  ...change,
});
const same = (from: number, to: number) =>
  Array.from({ length: to - from + 1 }, (_, i) => pair(`s${from + i}`, from + i, from + i));
const shown = (sections: readonly Section<Pair>[]) =>
  sections.map((s) => (s.kind === 'step' ? s.pair.id : s.pairs.map(({ id }) => id).join('+')));

describe('folding unchanged steps', () => {
  it('keeps one step open on either side of a change', () => {
    const pairs = [...same(1, 4), pair('s5', 5, 5, { kind: 'edited' }), ...same(6, 9)];
    expect(shown(foldSteps(pairs))).toEqual(['s1+s2+s3', 's4', 's5', 's6', 's7+s8+s9']);
  });

  it('does not fold one step alone', () => {
    const pairs = [...same(1, 2), pair('s3', 3, 3, { kind: 'edited' }), ...same(4, 5)];
    expect(shown(foldSteps(pairs))).toEqual(['s1', 's2', 's3', 's4', 's5']);
  });

  it('folds nothing that it was asked to keep', () => {
    expect(shown(foldSteps(same(1, 7), (id) => id === 's4'))).toEqual(['s1+s2', 's3', 's4', 's5', 's6+s7']);
  });

  it('breaks a fold where the steps do not follow one another in the old text too', () => {
    // Step 3 of the old text moved to the end; 2 and 4 are neighbours in the new text only.
    const pairs = [
      ...same(1, 2),
      ...[4, 5, 6, 7].map((n) => pair(`s${n}`, n, n - 1)),
      pair('s3', 3, 7, { moved: true }),
    ];
    expect(shown(foldSteps(pairs))).toEqual(['s1+s2', 's4+s5+s6', 's7', 's3']);
    expect(shown(oldOrder(foldSteps(pairs)))).toEqual(['s1+s2', 's3', 's4+s5+s6', 's7']);
  });

  it('leaves out of the old order what only the new text has', () => {
    expect(shown(oldOrder(foldSteps([pair('new', null, 1), pair('gone', 1, null)])))).toEqual(['gone']);
  });

  it('shows every step exactly once, in order, and never hides a change', () => {
    const kinds = fc.array(fc.constantFrom('same', 'edited', 'added', 'removed'), { maxLength: 40 });
    fc.assert(
      fc.property(kinds, (list) => {
        let [old, now] = [0, 0];
        const pairs = list.map((kind, i) =>
          pair(`p${i}`, kind === 'added' ? null : ++old, kind === 'removed' ? null : ++now, { kind } as Partial<Pair>),
        );
        const sections = foldSteps(pairs);
        expect(sections.flatMap((s) => (s.kind === 'step' ? [s.pair] : s.pairs))).toEqual(pairs);
        for (const s of sections)
          if (s.kind === 'fold') expect(s.pairs.every(({ kind }) => kind === 'same')).toBe(true);
      }),
    );
  });
});
