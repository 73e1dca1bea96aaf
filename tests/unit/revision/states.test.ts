import { describe, expect, it } from 'vitest';
import { move, MOVES, type Move } from '@/domain/revision/states';
import { REVISION_STATES, type RevisionState } from '@/domain/revision/types';

/** draft → proposed → (returned → proposed) → published → superseded; or declined. */
const WAYS: [RevisionState, Move, RevisionState][] = [
  ['draft', 'edit', 'draft'],
  ['draft', 'submit', 'proposed'],
  ['proposed', 'return', 'returned'],
  ['proposed', 'decline', 'declined'],
  ['proposed', 'agree', 'proposed'],
  ['proposed', 'override', 'proposed'],
  ['proposed', 'publish', 'published'],
  ['returned', 'edit', 'returned'],
  ['returned', 'submit', 'proposed'],
  ['published', 'supersede', 'superseded'],
];

describe('the life of a revision', () => {
  for (const state of REVISION_STATES)
    for (const by of Object.keys(MOVES) as Move[]) {
      const way = WAYS.find(([from, act]) => from === state && act === by);
      it(`${state}, ${by}: ${way ? way[2] : 'no way'}`, () => {
        const moved = move(state, by);
        expect(moved.ok ? moved.state : null).toBe(way?.[2] ?? null);
      });
    }

  it('says why there is no way', () => {
    expect(move('published', 'edit')).toEqual({
      ok: false,
      why: 'This proposal is published. Only a draft or a returned proposal can be edited.',
    });
    expect(move('draft', 'publish')).toEqual({
      ok: false,
      why: 'This proposal is a draft that its author has not sent in yet. Only a proposal that waits for review can be published.',
    });
  });
});
