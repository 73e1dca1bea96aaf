import { describe, expect, it } from 'vitest';
import type { Actor } from '@/domain/people/may';
import { decide, offers, type ProposalAct } from '@/domain/review/decide';
import { openTorques, overrideMissing, overText } from '@/domain/review/overrides';
import { canPublish, type ProposalFacts } from '@/domain/review/rules';
import { factsOf } from '../../factories/facts';

const HEAD = { key: 'head-bolt', name: 'Head bolt', share: 1.234 };
const ROD = { key: 'rod-bolt', name: 'Rod bolt', share: 1.0004 };
const by = (personId: string, torque: string, hash = 'text-1', reason = 'Tried on the bench') => ({
  personId,
  hash,
  torque,
  reason,
});
const agreed = (personId: string) => ({ personId, hash: 'text-1', base: 'C' });
const facts = (change: Partial<ProposalFacts> = {}) =>
  factsOf({ reason: 'They come loose.', agreements: [agreed('ines')], failing: [HEAD], ...change });
const editor = (personId: string): Actor => ({ personId, memberships: [{ in: 'common', role: 'editor' }] });
const act = (torque = 'head-bolt', reason = ' Stretch measured '): ProposalAct => ({ act: 'override', torque, reason });

const NEEDED =
  'The clamp check fails: this clamps Head bolt to 123 % of proof load. An editor must override it with a written reason first.';

describe('publishing', () => {
  it('is refused while one failing torque is open, in words that name the bolt and the share', () => {
    expect(canPublish(facts())).toEqual({ ok: false, why: NEEDED });
    expect(decide({ act: 'publish' }, editor('ines'), facts())).toEqual({ ok: false, kind: 'conflict', why: NEEDED });
    expect(canPublish(facts({ overrides: [by('tomas', 'head-bolt')] }))).toEqual({ ok: true });
  });

  it('says what else is missing, too', () => {
    expect(canPublish(facts({ agreements: [] }))).toEqual({ ok: false, why: `An editor must agree. ${NEEDED}` });
  });

  it('wants an override for each', () => {
    const two = { failing: [HEAD, ROD], overrides: [by('ines', 'head-bolt')] };
    expect(openTorques(facts(two))).toEqual([ROD]);
    expect(overrideMissing([HEAD, ROD])).toBe(
      'The clamp check fails: this clamps Head bolt to 123 % and Rod bolt to just over 100 % of proof load. An editor must override each of them with a written reason first.',
    );
  });

  it.each([
    ['another text', by('ines', 'head-bolt', 'text-0')],
    ['another torque', by('ines', 'rod-bolt')],
    ['the author', by('rowan', 'head-bolt')],
    ['somebody who is no editor of the book any more', by('formerly', 'head-bolt')],
    ['no reason', by('ines', 'head-bolt', 'text-1', ' \n')],
  ])('does not take an override of or by: %s', (_, override) => {
    expect(openTorques(facts({ overrides: [override], editorIds: ['ines', 'tomas', 'rowan'] }))).toEqual([HEAD]);
  });

  it('keeps an override when the same text stands on another base, for the load is the text’s own', () => {
    expect(openTorques(facts({ base: 'D', current: 'D', overrides: [by('ines', 'head-bolt')] }))).toEqual([]);
  });
});

describe('to override', () => {
  const refusal = (what: ProposalAct, actor: Actor, change: Partial<ProposalFacts> = {}) => {
    const answer = decide(what, actor, facts(change));
    return answer.ok ? 'done' : `${answer.kind}: ${answer.why}`;
  };

  it('records who, which text, which torque and why; agreements and state stay', () => {
    expect(decide(act(), editor('tomas'), facts())).toEqual({
      ok: true,
      state: 'proposed',
      agreements: [agreed('ines')],
      given: null,
      overridden: by('tomas', 'head-bolt', 'text-1', 'Stretch measured'),
    });
  });

  const pier = { book: { kind: 'shop', shopId: 'pier' } } as const;
  const pierEditor: Actor = { personId: 'ines', memberships: [{ in: 'shop', shopId: 'pier', role: 'editor' }] };
  it.each<[string, ProposalAct, Actor, Partial<ProposalFacts>, string]>([
    ['a reason', act('head-bolt', ' '), editor('ines'), {}, 'invalid: Write why this torque is right all the same.'],
    [
      'a failing torque',
      act('rod-bolt'),
      editor('ines'),
      {},
      'invalid: The clamp check of this text does not fail at “rod-bolt”.',
    ],
    [
      'something failing',
      act(),
      editor('ines'),
      { failing: [] },
      'conflict: No torque of this text fails the clamp check.',
    ],
    [
      'an open torque',
      act(),
      editor('ines'),
      { overrides: [by('tomas', 'head-bolt')] },
      'conflict: The clamp check of this torque has been overridden already.',
    ],
    [
      'somebody else',
      act(),
      editor('rowan'),
      {},
      'forbidden: You wrote this proposal. Nobody overrides the clamp check of their own.',
    ],
    [
      'an editor of this book',
      act(),
      pierEditor,
      {},
      'forbidden: Only an editor of the common book overrides the clamp check of a proposal.',
    ],
    [
      'a reader of this book',
      act(),
      editor('ines'),
      pier,
      'hidden: There is no such thing here, or it is not yours to see.',
    ],
    [
      'a proposal that waits',
      act(),
      editor('ines'),
      { state: 'returned' },
      'conflict: This proposal has gone back to its author. The clamp check is overridden only while a proposal waits for review.',
    ],
    [
      'the current base',
      act(),
      editor('ines'),
      { current: 'D' },
      'conflict: Revision D was published after this text was written on revision C. The author must bring it up to revision D first.',
    ],
  ])('takes %s', (_, what, actor, change, why) => expect(refusal(what, actor, change)).toBe(why));

  it('is open to a shop’s one editor, never to who stands in for a second', () => {
    const one = { ...pier, editorIds: ['ines'], standInIds: ['sol'], criticalReasons: ['a torque changes: Head bolt'] };
    const senior: Actor = { personId: 'sol', memberships: [{ in: 'shop', shopId: 'pier', role: 'senior' }] };
    expect(refusal(act(), pierEditor, one)).toBe('done');
    expect(refusal(act(), senior, one)).toMatch(/^forbidden/);
  });

  it('is offered as long as a torque is open', () => {
    expect(offers(editor('ines'), facts()).override.ok).toBe(true);
    expect(offers(editor('ines'), facts({ overrides: [by('tomas', 'head-bolt')] })).override.ok).toBe(false);
    expect(offers(editor('ines'), facts({ failing: [] })).override.ok).toBe(false);
    expect(offers(editor('rowan'), facts()).override.ok).toBe(false);
  });
});

it.each([
  [1.0004, 'just over 100 %'],
  [1.0049, 'just over 100 %'],
  [1.005, '101 %'],
  [1.432, '143 %'],
])('never calls %f of proof load 100 %%', (share, text) => expect(overText(share)).toBe(text));
