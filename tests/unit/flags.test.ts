import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decideFlag, FLAG_STATES, readsFlag, type FlagAct, type FlagFacts } from '@/domain/flags/flags';
import type { Actor } from '@/domain/people/may';

const member = (personId: string, shopId: string, role: 'apprentice' | 'technician' | 'senior' | 'owner'): Actor => ({
  personId,
  memberships: [{ in: 'shop', shopId, role }],
});
const apprentice = member('a', 'north', 'apprentice');
const senior = member('s', 'north', 'senior');
const elsewhere = member('e', 'pier', 'senior');
const editor: Actor = { personId: 'c', memberships: [{ in: 'common', role: 'editor' }] };
const flag: FlagFacts = { book: { kind: 'common' }, raisedBy: 'a', raiserShops: ['north'], state: 'open' };
const answer = (text = 'Read step 4.'): FlagAct => ({ act: 'answer', text });

describe('a flag', () => {
  it('is seen by whoever raised it, the seniors of their shop and the editors of the book, and by no other shop', () => {
    expect([apprentice, senior, editor].map((actor) => readsFlag(actor, flag))).toEqual([true, true, true]);
    expect([elsewhere, member('b', 'north', 'apprentice')].map((actor) => readsFlag(actor, flag))).toEqual([
      false,
      false,
    ]);
    expect(decideFlag(answer(), elsewhere, flag)).toMatchObject({ ok: false, kind: 'hidden' });
  });

  it('is answered with words, by somebody else', () => {
    expect(decideFlag(answer(), senior, flag)).toEqual({ ok: true, state: 'answered' });
    expect(decideFlag(answer('  '), senior, flag)).toMatchObject({ ok: false, kind: 'invalid' });
    expect(decideFlag(answer(), apprentice, flag)).toMatchObject({ ok: false, kind: 'forbidden' });
    expect(decideFlag(answer(), senior, { ...flag, raisedBy: 's' })).toMatchObject({ ok: false, kind: 'forbidden' });
  });

  it('is taken up or taken back', () => {
    expect(decideFlag({ act: 'take up' }, editor, flag)).toEqual({ ok: true, state: 'taken up' });
    expect(decideFlag({ act: 'withdraw' }, apprentice, flag)).toEqual({ ok: true, state: 'withdrawn' });
    expect(decideFlag({ act: 'withdraw' }, senior, flag)).toMatchObject({ ok: false, kind: 'forbidden' });
  });

  it('ends once, whoever acts in whatever order', () => {
    const actor = fc.constantFrom(apprentice, senior, elsewhere, editor);
    const act = fc.constantFrom<FlagAct>(answer(), { act: 'take up' }, { act: 'withdraw' });
    fc.assert(
      fc.property(fc.array(fc.tuple(actor, act), { maxLength: 12 }), (acts) => {
        let state: FlagFacts['state'] = 'open';
        let ends = 0;
        for (const [who, what] of acts) {
          const decision = decideFlag(what, who, { ...flag, state });
          if (!decision.ok) continue;
          state = decision.state;
          ends += 1;
        }
        expect(ends).toBeLessThanOrEqual(1);
        expect(FLAG_STATES).toContain(state);
      }),
    );
  });
});
