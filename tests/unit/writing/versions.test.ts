import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  MOST_VERSIONS,
  SITTING_GAP,
  sittingOf,
  SPACING,
  thinnedOut,
  VERSION_KINDS,
  type Version,
  type VersionKind,
} from '@/domain/writing/versions';

interface Save {
  kind: VersionKind;
  page: string | null;
  /** Milliseconds since the save before. */
  wait: number;
}

/** Versions as the saves make them, each told its sitting by the one before. */
function play(saves: readonly Save[], each: (versions: Version[]) => Version[] = (all) => all): Version[] {
  let time = Date.parse('2026-12-01T08:00:00.000Z');
  let kept: Version[] = [];
  for (const [i, { kind, page, wait }] of saves.entries()) {
    time += wait;
    const at = new Date(time).toISOString();
    const sittingAt = kind === 'write' ? sittingOf(kept.at(-1), at, page) : at;
    kept = each([...kept, { n: i + 1, kind, at, sittingAt, page }]);
  }
  return kept;
}
const thin = (most?: number) => (versions: Version[]) => {
  const gone = thinnedOut(versions, most);
  return versions.filter(({ n }) => !gone.includes(n));
};
const numbers = (versions: readonly Version[]) => versions.map(({ n }) => n);
const writes = (...minutes: number[]): Save[] => minutes.map((m) => ({ kind: 'write', page: 'p', wait: m * 60_000 }));
const act = (kind: VersionKind): Save => ({ kind, page: null, wait: 10_000 });

const save: fc.Arbitrary<Save> = fc.record({
  kind: fc.oneof({ weight: 8, arbitrary: fc.constant('write' as const) }, fc.constantFrom(...VERSION_KINDS)),
  page: fc.constantFrom('one', 'two', null),
  wait: fc.oneof(
    { weight: 6, arbitrary: fc.integer({ min: 500, max: 90_000 }) },
    fc.integer({ min: 500, max: 2 * SITTING_GAP }),
  ),
});

describe('versions that are kept', () => {
  it('are one for five minutes of a sitting, with its first and its last', () => {
    // Saves after 0, 1, 2, 3, 6, 7, 11 and 12 minutes of one sitting, then one an hour later.
    const kept = play([act('start'), ...writes(0.5, 1, 1, 1, 3, 1, 4, 1, 60)], thin());
    expect(numbers(kept)).toEqual([1, 2, 5, 7, 9, 10]);
  });

  it('hold what stood before a going back, an agreement asked for, and another revision', () => {
    for (const kind of ['restore', 'merge', 'submit', 'aside', 'suggestion'] as const) {
      const kept = play([act('start'), ...writes(0.5, 0.5, 0.5), act(kind), ...writes(0.2, 0.2)], thin());
      expect(numbers(kept)).toEqual([1, 2, 4, 5, 6, 7]);
    }
  });

  it('hold both texts where two pages write in turn', () => {
    const saves = ['a', 'a', 'b', 'a', 'a'].map((page): Save => ({ kind: 'write', page, wait: 5000 }));
    expect(numbers(play(saves, thin()))).toEqual([1, 2, 3, 4, 5]);
  });

  it('are the same whether each save thins them or one look at the whole history does', () => {
    fc.assert(
      fc.property(fc.array(save, { maxLength: 60 }), (saves) => {
        const whole = play(saves);
        expect(numbers(play(saves, thin(Infinity)))).toEqual(numbers(thin(Infinity)(whole)));
      }),
      { numRuns: 300 },
    );
  });

  it('are those that a plain reading of the rule keeps', () => {
    fc.assert(
      fc.property(fc.array(save, { maxLength: 60 }), (saves) => {
        const all = play(saves);
        const kept = new Set(numbers(thin(Infinity)(all)));
        all.forEach((version, i) => {
          const [next, last] = [all[i + 1], i === all.length - 1];
          const sitting = all.filter(
            (v) => v.kind === 'write' && v.sittingAt === version.sittingAt && v.page === version.page,
          );
          const mustStay =
            i === 0 ||
            last ||
            version.kind !== 'write' ||
            next?.kind !== 'write' ||
            sitting[0] === version ||
            sitting.at(-1) === version;
          if (mustStay) expect(kept).toContain(version.n);
          // Whoever wrote on finds a version of the same sitting within five minutes.
          else if (!kept.has(version.n))
            expect(
              sitting.some(
                (v) => kept.has(v.n) && v.n > version.n && Date.parse(v.at) - Date.parse(version.at) < SPACING,
              ),
            ).toBe(true);
        });
      }),
      { numRuns: 300 },
    );
  });

  it('are never more than the cap, and lose the oldest first, but not the first, the last and what was sent in', () => {
    fc.assert(
      fc.property(fc.array(save, { maxLength: 80 }), fc.integer({ min: 3, max: 20 }), (saves, most) => {
        const all = play(saves);
        const kept = thin(most)(all);
        const sentIn = all.filter(({ kind }) => kind === 'submit');
        expect(kept.length).toBeLessThanOrEqual(Math.max(most, sentIn.length + 2));
        expect(numbers(kept)).toEqual(expect.arrayContaining(numbers(sentIn)));
        if (all.length > 0) expect([kept[0], kept.at(-1)]).toEqual([all[0], all.at(-1)]);
        const uncapped = thin(Infinity)(all);
        const lost = uncapped.filter((v) => !kept.includes(v));
        const rest = kept.slice(1, -1).filter(({ kind }) => kind !== 'submit');
        if (lost.length && rest.length) expect(Math.max(...numbers(lost))).toBeLessThan(Math.min(...numbers(rest)));
      }),
    );
    expect(MOST_VERSIONS).toBe(100);
  });

  it('a page of 100 sittings keeps exactly the cap', () => {
    const kept = play(
      Array.from({ length: 150 }, (): Save => ({ kind: 'write', page: 'p', wait: 2 * SITTING_GAP })),
      thin(),
    );
    expect(kept).toHaveLength(100);
    expect(numbers(kept).slice(0, 2)).toEqual([1, 52]);
  });
});
