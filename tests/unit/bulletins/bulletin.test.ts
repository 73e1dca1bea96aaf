import { describe, expect, it } from 'vitest';
import { asksFor, changeWords } from '@/domain/bulletins/bulletin';
import { decideWithdrawal, type WithdrawalFacts } from '@/domain/bulletins/withdrawal';
import type { Actor } from '@/domain/people/may';
import { canPublish, type ProposalFacts } from '@/domain/review/rules';

const editor: Actor = { personId: 'e', memberships: [{ in: 'common', role: 'editor' }] };
const facts = (change: Partial<WithdrawalFacts> = {}): WithdrawalFacts => ({
  number: 'P-0142',
  book: { kind: 'common' },
  published: true,
  withdrawn: false,
  last: null,
  ...change,
});

describe('what a publication tells everybody', () => {
  it('says each critical reason as a sentence', () => {
    expect(changeWords(['a torque changes: Cover bolt', 'a hold point is removed in “Tighten”.'], 'A')).toEqual([
      'A torque changes: Cover bolt.',
      'A hold point is removed in “Tighten”.',
    ]);
  });
  it('says nothing of an ordinary change, and nothing of a first revision, which nobody has worked from', () => {
    expect(changeWords([], 'A')).toBeNull();
    expect(changeWords(['a new sheet gives a torque: Cover bolt'], null)).toBeNull();
  });
});

describe('who is asked to sign', () => {
  const reading = {
    kind: 'critical change',
    at: '2026-02-01T00:00:00.000Z',
    overtaken: false,
    own: false,
    readerSince: '2026-01-01T00:00:00.000Z',
    signedAt: null,
  } as const;
  it('every reader, once', () => {
    expect(asksFor(reading)).toBe(true);
    expect(asksFor({ ...reading, signedAt: '2026-02-02T00:00:00.000Z' })).toBe(false);
  });
  it('not whoever caused it, nor whoever came later, nor anybody once it is overtaken', () => {
    expect(asksFor({ ...reading, own: true })).toBe(false);
    expect(asksFor({ ...reading, readerSince: '2026-02-01T00:00:00.001Z' })).toBe(false);
    expect(asksFor({ ...reading, overtaken: true })).toBe(false);
  });
});

describe('a withdrawal', () => {
  it('takes a reason, and says what the reason is for', () => {
    expect(decideWithdrawal('withdraw', editor, facts(), ' Two bolts broke. ')).toEqual({
      ok: true,
      done: false,
      reason: 'Two bolts broke.',
    });
    expect(decideWithdrawal('withdraw', editor, facts(), '  \n')).toMatchObject({ ok: false, kind: 'invalid' });
  });
  it('is of a published sheet only', () => {
    expect(decideWithdrawal('withdraw', editor, facts({ published: false }), 'why')).toMatchObject({ kind: 'hidden' });
  });
  it('pressed twice is done once; by another, or with another reason, it is a conflict', () => {
    const last = { act: 'withdraw', personId: 'e', reason: 'why' } as const;
    const now = facts({ withdrawn: true, last });
    expect(decideWithdrawal('withdraw', editor, now, 'why')).toMatchObject({ ok: true, done: true });
    expect(decideWithdrawal('withdraw', editor, now, 'other')).toMatchObject({ ok: false, kind: 'conflict' });
    expect(decideWithdrawal('withdraw', { ...editor, personId: 'f' }, now, 'why')).toMatchObject({ kind: 'conflict' });
  });
  it('is undone only where it stands', () => {
    expect(decideWithdrawal('bringBack', editor, facts(), 'why')).toMatchObject({ ok: false, kind: 'conflict' });
    expect(decideWithdrawal('bringBack', editor, facts({ withdrawn: true }), 'why')).toMatchObject({ done: false });
  });
  it('lets no proposal be published, however many have agreed', () => {
    const proposal: ProposalFacts = {
      book: { kind: 'common' },
      authorId: 'a',
      state: 'proposed',
      everProposed: true,
      hash: 'h',
      base: 'A',
      current: 'A',
      identical: false,
      reason: 'r',
      criticalReasons: [],
      agreements: [{ personId: 'e', hash: 'h', base: 'A' }],
      editorIds: ['e'],
      failing: [],
      overrides: [],
      standInIds: [],
    };
    expect(canPublish(proposal)).toEqual({ ok: true });
    const verdict = canPublish({ ...proposal, withdrawn: true });
    expect(verdict).toMatchObject({ ok: false, why: expect.stringContaining('withdrawn') as string });
  });
});
