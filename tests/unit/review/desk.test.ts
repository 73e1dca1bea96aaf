import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SEVERITY_LEVELS, type Severity } from '@/domain/revision/types';
import { deskCount, type DeskItem, deskOrder, deskReason, takenBackWords } from '@/domain/review/desk';

const ORDINARY: Severity = { level: 'ordinary', because: [] };
const SERIOUS: Partial<DeskItem> = {
  criticalReasons: ['a torque changes: Cover bolt'],
  severity: { level: 'serious', because: ['a torque changes (Cover bolt)'] },
};
const GRAVE: Partial<DeskItem> = {
  criticalReasons: ['a limit changes: Gap'],
  severity: { level: 'grave', because: ['the limit “Gap” is wider'] },
};
const item = (id: string, change: Partial<DeskItem> = {}): DeskItem => ({
  id,
  base: 'C',
  criticalReasons: [],
  severity: ORDINARY,
  proposedAt: '2026-11-28T09:00:00Z',
  agreements: 0,
  ...change,
});

describe('the order of the review desk', () => {
  it('puts what can hurt somebody now first, then what has waited longest', () => {
    const items = [
      item('new', { base: null }),
      item('young', { proposedAt: '2026-11-30T09:00:00Z' }),
      item('old'),
      item('serious new', { base: null, ...SERIOUS, proposedAt: '2026-01-01T00:00:00Z' }),
      item('serious', { ...SERIOUS, proposedAt: '2026-11-30T10:00:00Z' }),
      item('grave, young', { ...GRAVE, proposedAt: '2026-11-30T12:00:00Z' }),
      item('grave, old', { ...GRAVE, proposedAt: '2026-11-29T12:00:00Z' }),
    ];
    expect(deskOrder(items).map(({ id }) => id)).toEqual([
      'grave, old',
      'grave, young',
      'serious',
      'serious new',
      'old',
      'young',
      'new',
    ]);
  });

  it('is the same whatever order it was given', () => {
    const any = fc.record({
      id: fc.uuid(),
      base: fc.constantFrom(null, 'A'),
      criticalReasons: fc.constant([]),
      severity: fc.constantFrom(...SEVERITY_LEVELS).map((level): Severity => ({ level, because: [level] })),
      proposedAt: fc.constantFrom('2026-11-28T09:00:00Z', '2026-11-29T09:00:00Z'),
      agreements: fc.nat(2),
    });
    const lists = fc
      .uniqueArray(any, { selector: ({ id }) => id })
      .chain((list) => fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length })));
    fc.assert(
      fc.property(lists, ([list, shuffled]) => {
        const sorted = deskOrder(list);
        expect(deskOrder(shuffled)).toEqual(sorted);
        const levels = sorted.map(({ severity }) => SEVERITY_LEVELS.indexOf(severity.level));
        expect(levels).toEqual([...levels].sort((a, b) => b - a));
      }),
    );
  });

  it.each<[Partial<DeskItem>, string]>([
    [{}, 'An ordinary change to a sheet in use. Waiting 3 days, 0 of 1 agreed.'],
    [{ base: null, proposedAt: '2026-12-01T08:00:00Z' }, 'A new sheet. Sent in today, 0 of 1 agreed.'],
    [
      { ...SERIOUS, agreements: 1, proposedAt: '2026-11-30T08:00:00Z' },
      'Serious: a torque changes (Cover bolt). Waiting 1 day, 1 of 2 agreed.',
    ],
    [
      { ...GRAVE, severity: { level: 'grave', because: ['the limit “Gap” is wider', 'a hold point is dropped'] } },
      'Grave: the limit “Gap” is wider, and 1 more. Waiting 3 days, 0 of 2 agreed.',
    ],
  ])('says why: %o', (change, words) => {
    expect(deskReason(item('x', change), '2026-12-01T10:00:00Z')).toBe(words);
  });
});

describe('how much of a desk is the reader’s', () => {
  const one = (next: 'agree' | 'publish' | 'wait', stale = false) => ({ next, stale });

  it('counts what they can do, apart from what waits for its author or for another editor', () => {
    expect(deskCount([one('agree'), one('publish'), one('wait'), one('agree', true)])).toBe(
      '2 proposals wait for you, 2 for others.',
    );
    expect(deskCount([one('publish')])).toBe('1 proposal waits for you.');
    expect(deskCount([one('wait')])).toBe('Nothing here waits for you; 1 proposal waits for others.');
    expect(deskCount([])).toBe('');
  });
});

describe('what a proposal takes back', () => {
  const back = (...what: string[]) => [{ revision: 'C', what }];

  it('is told in a sentence for each revision', () => {
    expect(takenBackWords([...back('Cover bolt torque, 10 to 12 N·m'), { revision: 'B', what: ['Gap'] }], 2)).toEqual([
      'Takes back what revision C changed: Cover bolt torque, 10 to 12 N·m.',
      'Takes back what revision B changed: Gap.',
    ]);
    expect(takenBackWords(back('Gap'), 2, true)).toEqual(['Took back what revision C changed: Gap.']);
    expect(takenBackWords([], 2)).toEqual([]);
  });

  it('counts what does not fit, and never a rest of one', () => {
    expect(takenBackWords(back('a', 'b', 'c'), 2)).toEqual(['Takes back what revision C changed: a; b; c.']);
    expect(takenBackWords(back('a', 'b', 'c', 'd'), 2)).toEqual([
      'Takes back what revision C changed: a; b; and 2 more.',
    ]);
  });
});
