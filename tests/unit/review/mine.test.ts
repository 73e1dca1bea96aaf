import { describe, expect, it } from 'vitest';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { mineAddress, readMineView, viewMine, waitsFor } from '@/domain/review/mine';

const one = (more: Partial<ProposalSummary>): ProposalSummary =>
  ({
    id: 'x',
    title: 'T',
    state: 'draft',
    updatedAt: '2026-11-01',
    stale: false,
    base: 'A',
    agreements: 0,
    agreementsNeeded: 1,
    ...more,
  }) as ProposalSummary;

const all = [
  one({ id: '1', title: 'Beta', state: 'proposed', updatedAt: '2026-11-03' }),
  one({ id: '2', title: 'Alpha', state: 'draft', updatedAt: '2026-11-01' }),
  one({ id: '3', title: 'Gamma', state: 'returned', updatedAt: '2026-11-02' }),
  one({ id: '4', title: 'Delta', state: 'published', updatedAt: '2026-11-04' }),
];
const shown = (query: string) => viewMine(all, readMineView(new URLSearchParams(query))).map(({ id }) => id);

describe('looking through my proposals', () => {
  it.each([
    ['', ['1', '3', '2']],
    ['turned', ['2', '3', '1']],
    ['sort=title', ['2', '1', '3']],
    ['sort=state', ['3', '2', '1']],
    ['show=done', ['4']],
    ['show=draft', ['2']],
    ['show=all&sort=title&turned', ['3', '4', '1', '2']],
    ['show=constructor&sort=nonsense', ['1', '3', '2']],
  ])('"%s"', (query, ids) => expect(shown(query)).toEqual(ids));

  it('stands in the address', () => {
    for (const query of ['', 'show=done&sort=title&turned', 'turned']) {
      const view = readMineView(new URLSearchParams(query));
      expect(readMineView(new URL(mineAddress(view), 'http://here').searchParams)).toEqual(view);
    }
    expect(mineAddress(readMineView(new URLSearchParams()))).toBe('/proposals');
  });

  it('says whom it waits for', () => {
    expect(waitsFor(one({ state: 'proposed', agreementsNeeded: 2 }))).toBe('2 editors to agree');
    expect(waitsFor(one({ state: 'proposed', agreementsNeeded: 2, agreements: 1 }))).toBe('An editor to agree');
    expect(waitsFor(one({ state: 'proposed', agreementsNeeded: 1, agreements: 1 }))).toBe('An editor to publish it');
    expect(waitsFor(one({ stale: true }))).toBe('You: revision A is no longer current');
  });
});
