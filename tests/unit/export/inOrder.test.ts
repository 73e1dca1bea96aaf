import fc from 'fast-check';
import { expect, test } from 'vitest';
import { inOrder, type Happening } from '@/domain/export/git/inOrder';

const T = '2026-01-02T03:04:05.000Z';
const one = (kind: Happening['kind'], at = T, number = 'P-0142'): Happening => ({ kind, at, number });

test('by time, then by number', () => {
  const later = one('published', '2026-02-01T00:00:00.000Z', 'P-0101');
  expect(inOrder([later, one('published', T, 'P-0150'), one('published', T, 'P-0142')])).toEqual([
    one('published', T, 'P-0142'),
    one('published', T, 'P-0150'),
    later,
  ]);
});

test('what was published at the instant of a withdrawal was published before it, and after a bringing back', () => {
  expect(inOrder([one('withdrawn'), one('published')]).map(({ kind }) => kind)).toEqual(['published', 'withdrawn']);
  const early = '2026-01-01T00:00:00.000Z';
  expect(inOrder([one('brought back'), one('published'), one('withdrawn', early)]).map(({ kind }) => kind)).toEqual([
    'withdrawn',
    'brought back',
    'published',
  ]);
});

test('whatever a procedure went through, nothing is published while it is withdrawn, and nothing is lost', () => {
  // A history that can have been, at a clock that often stands still.
  const history = fc.array(fc.tuple(fc.constantFrom('publish', 'turn'), fc.integer({ min: 0, max: 1 }))).map((acts) => {
    let [withdrawn, time] = [false, 0];
    return acts.flatMap(([act, passed]): Happening[] => {
      time += passed;
      const at = new Date(time * 1000).toISOString();
      if (act === 'publish') return withdrawn ? [] : [one('published', at)];
      withdrawn = !withdrawn;
      return [one(withdrawn ? 'withdrawn' : 'brought back', at)];
    });
  });
  fc.assert(
    fc.property(history, (happened) => {
      // As they are loaded: publications first, then the others in the order they were written.
      const loaded = [
        ...happened.filter(({ kind }) => kind === 'published'),
        ...happened.filter(({ kind }) => kind !== 'published'),
      ];
      const ordered = inOrder(loaded);
      expect(ordered).toHaveLength(happened.length);
      let withdrawn = false;
      for (const { kind } of ordered) {
        if (kind === 'published') expect(withdrawn).toBe(false);
        else {
          expect(kind === 'withdrawn').toBe(!withdrawn);
          withdrawn = kind === 'withdrawn';
        }
      }
    }),
  );
});
