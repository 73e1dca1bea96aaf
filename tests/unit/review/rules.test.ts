import { describe, expect, it } from 'vitest';
import type { Actor, Membership } from '@/domain/people/may';
import { decide, offers, type ProposalAct } from '@/domain/review/decide';
import { canPublish, type ProposalFacts, standing, tally } from '@/domain/review/rules';
import { factsOf } from '../../factories/facts';

const TORQUE = 'a torque changes: Cover bolt';
const SHOP = { kind: 'shop', shopId: 'pier' } as const;
const by = (personId: string, hash = 'text-1', base: string | null = 'C') => ({ personId, hash, base });
const editor = (personId: string): Actor => ({ personId, memberships: [{ in: 'common', role: 'editor' }] });
const pier = (personId: string, ...roles: Extract<Membership, { in: 'shop' }>['role'][]): Actor => ({
  personId,
  memberships: roles.map((role) => ({ in: 'shop', shopId: 'pier', role })),
});

describe('which agreements stand', () => {
  it('counts a person once, for this text on this base, while they hold the role, and never the author', () => {
    const agreements = [
      by('ines'),
      by('ines'),
      by('tomas', 'text-0'),
      by('tomas', 'text-1', 'B'),
      by('rowan'),
      by('formerly an editor'),
    ];
    expect(standing(factsOf({ agreements, editorIds: ['ines', 'tomas', 'rowan'] }))).toEqual({
      editors: ['ines'],
      standIns: [],
    });
  });

  it('lets a senior technician stand in for the second editor where the shop has one, for a critical change only', () => {
    const shop = {
      book: SHOP,
      editorIds: ['ines'],
      standInIds: ['sol', 'per'],
      agreements: [by('sol'), by('per'), by('ines')],
    };
    expect(standing(factsOf({ ...shop, criticalReasons: [TORQUE] })).standIns).toEqual(['sol', 'per']);
    expect(standing(factsOf({ ...shop })).standIns).toEqual([]);
    expect(standing(factsOf({ ...shop, criticalReasons: [TORQUE], editorIds: ['ines', 'tomas'] })).standIns).toEqual(
      [],
    );
    expect(standing(factsOf({ ...shop, criticalReasons: [TORQUE], book: { kind: 'common' } })).standIns).toEqual([]);
  });
});

describe('what is missing, in words', () => {
  const critical = { criticalReasons: [TORQUE] };
  const small = { ...critical, book: SHOP, editorIds: ['ines'], standInIds: ['sol', 'per'] };
  it.each<[string, Partial<ProposalFacts>, string | null, string]>([
    ['ordinary', {}, 'An editor must agree.', '0 of 1'],
    ['ordinary, agreed', { agreements: [by('ines')] }, null, '1 of 1'],
    ['critical', critical, `Two editors must agree, because ${TORQUE}.`, '0 of 2'],
    [
      'critical, one agreed',
      { ...critical, agreements: [by('ines')] },
      `One more editor must agree, because ${TORQUE}.`,
      '1 of 2',
    ],
    ['critical, two agreed', { ...critical, agreements: [by('ines'), by('tomas')] }, null, '2 of 2'],
    ['one editor', small, `The editor and a senior technician or the owner must agree, because ${TORQUE}.`, '0 of 2'],
    [
      'one editor agreed',
      { ...small, agreements: [by('ines')] },
      `A senior technician or the owner of the shop must agree too, because ${TORQUE}.`,
      '1 of 2',
    ],
    [
      'two stand-ins are one',
      { ...small, agreements: [by('sol'), by('per')] },
      `An editor must agree too, because ${TORQUE}.`,
      '1 of 2',
    ],
    ['editor and stand-in', { ...small, agreements: [by('sol'), by('ines')] }, null, '2 of 2'],
  ])('%s', (_name, change, missing, count) => {
    const got = tally(factsOf(change));
    expect(got.missing).toBe(missing);
    expect(`${got.given} of ${got.needed}`).toBe(count);
    expect(canPublish(factsOf(change))).toEqual(missing === null ? { ok: true } : { ok: false, why: missing });
  });
});

describe('decide', () => {
  const refusal = (what: ProposalAct, actor: Actor, change: Partial<ProposalFacts>) => {
    const answer = decide(what, actor, factsOf(change));
    return answer.ok ? 'done' : `${answer.kind}: ${answer.why}`;
  };

  it('records the agreement of the editor who publishes', () => {
    const answer = decide({ act: 'publish' }, editor('ines'), factsOf());
    expect(answer).toEqual({
      ok: true,
      state: 'published',
      agreements: [by('ines')],
      given: by('ines'),
      overridden: null,
    });
    const again = decide({ act: 'publish' }, editor('ines'), factsOf({ agreements: [by('ines')] }));
    expect(again).toMatchObject({ ok: true, given: null, agreements: [by('ines')] });
  });

  it('lets the second editor publish a critical change by agreeing to it', () => {
    const critical = { criticalReasons: [TORQUE], agreements: [by('ines')] };
    expect(refusal({ act: 'publish' }, editor('ines'), critical)).toBe(
      `conflict: One more editor must agree, because ${TORQUE}.`,
    );
    expect(refusal({ act: 'publish' }, editor('tomas'), critical)).toBe('done');
  });

  it.each<[string, ProposalAct, Actor, Partial<ProposalFacts>, string]>([
    ['own', { act: 'publish' }, editor('rowan'), {}, 'forbidden: You wrote this proposal. Nobody publishes their own.'],
    [
      'hidden',
      { act: 'agree' },
      editor('ines'),
      { book: SHOP },
      'hidden: There is no such thing here, or it is not yours to see.',
    ],
    [
      'twice',
      { act: 'agree' },
      editor('ines'),
      { agreements: [by('ines')] },
      'conflict: You have agreed to this text already.',
    ],
    [
      'state',
      { act: 'agree' },
      editor('ines'),
      { state: 'declined' },
      'conflict: This proposal was declined. Only a proposal that waits for review can be agreed to.',
    ],
    [
      'stale',
      { act: 'publish' },
      editor('ines'),
      { current: 'D' },
      'conflict: Revision D was published after this text was written on revision C. The author must bring it up to revision D first.',
    ],
    [
      'stale agree',
      { act: 'agree' },
      editor('ines'),
      { base: null },
      'conflict: Revision C was published meanwhile, and this text was written as a new procedure.',
    ],
    [
      'no reason to return',
      { act: 'return', reason: ' ' },
      editor('ines'),
      {},
      'invalid: Write why, so that the author can act on it.',
    ],
    ['stale return', { act: 'return', reason: 'Bring it up to D.' }, editor('ines'), { current: 'D' }, 'done'],
    [
      'no reason to submit',
      { act: 'submit' },
      pier('rowan', 'senior'),
      { state: 'draft', reason: '' },
      'invalid: Write the reason for the change before you send it in.',
    ],
    [
      'nothing to submit',
      { act: 'submit' },
      pier('rowan', 'senior'),
      { state: 'draft', identical: true },
      'invalid: Nothing differs from the published text yet. Change it, then send it in.',
    ],
    ['submit', { act: 'submit' }, pier('rowan', 'senior'), { state: 'draft', everProposed: false }, 'done'],
    [
      'edit while it waits',
      { act: 'edit' },
      pier('rowan', 'senior'),
      {},
      'conflict: This proposal is waiting for review. Only a draft or a returned proposal can be edited.',
    ],
  ])('%s', (_name, what, actor, change, want) => {
    expect(refusal(what, actor, change)).toBe(want);
  });

  it('offers what can be done now', () => {
    const open = (actor: Actor, change: Partial<ProposalFacts>) =>
      Object.entries(offers(actor, factsOf(change))).flatMap(([act, answer]) => (answer.ok ? [act] : []));
    expect(open(editor('ines'), {})).toEqual(['return', 'decline', 'agree', 'publish']);
    expect(open(editor('ines'), { criticalReasons: [TORQUE] })).toEqual(['return', 'decline', 'agree']);
    expect(open(pier('rowan', 'senior'), {})).toEqual([]);
    expect(open(pier('rowan', 'senior'), { state: 'returned', reason: '' })).toEqual(['edit', 'submit']);
    expect(open(pier('sol', 'senior'), { book: SHOP, editorIds: ['ines'], criticalReasons: [TORQUE] })).toEqual([
      'agree',
    ]);
  });
});
