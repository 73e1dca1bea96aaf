import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Actor } from '@/domain/people/may';
import { decide, type ProposalAct } from '@/domain/review/decide';
import type { ProposalFacts } from '@/domain/review/rules';
import { bookEditorOf, holdsOf, membership, PEOPLE, world, type Drawn, type Hold, type World } from './world';

interface Tally {
  published: number;
  /** Of them, with a torque past proof load that somebody had to answer for. */
  overridden: number;
  /** Refused for the want of an override alone: one later override and it would have gone through. */
  heldBack: number;
}

/**
 * Plays a world and keeps a plain diary beside it, which knows nothing of the rules' own bookkeeping: who said yes to
 * which words, and who wrote for which torque of which words why it stays.
 */
function play(drawn: World, tally: Tally): void {
  const { book, author, start, baseOver, events } = drawn;
  const held = holdsOf(drawn);
  const actor = (i: number): Actor => ({ personId: PEOPLE[i]!, memberships: held[i]!.map(membership) });
  const holding = (...roles: Hold[]) => PEOPLE.filter((_, i) => roles.some((role) => held[i]!.includes(role)));
  const editors = () => holding(bookEditorOf(book));
  const standIns = () =>
    book.kind === 'common' ? [] : holding(`${book.shopId} senior` as Hold, `${book.shopId} owner` as Hold);
  const agreed: { person: string; words: string }[] = [];
  const answered: { person: string; text: string; torque: string; reason: string }[] = [];
  /** Torques past proof load in each revision of the book; the last is the current one. */
  const revisions = [baseOver];
  const current = () => revisions.length - 1;
  let stand: Drawn & { base: number } = { ...start, base: 0 };
  let proposal: Pick<ProposalFacts, 'state' | 'agreements' | 'everProposed' | 'overrides'> = {
    state: 'draft',
    agreements: [],
    overrides: [],
    everProposed: false,
  };
  const text = () => `${stand.text} ${stand.critical} ${stand.over.join('+')}`;
  const words = () => `${text()} on ${stand.base}`;
  // A load that stood in the base already is answered for.
  const failing = () => stand.over.filter((key) => !revisions[stand.base]!.includes(key));
  const facts = (reason: string): ProposalFacts => ({
    ...proposal,
    book,
    authorId: PEOPLE[author]!,
    hash: text(),
    base: String(stand.base),
    current: String(current()),
    identical: false,
    reason,
    criticalReasons: stand.critical ? ['a torque changes: Cover bolt'] : [],
    failing: failing().map((key) => ({ key, name: key, share: 1.2 })),
    editorIds: editors(),
    standInIds: standIns(),
  });

  for (const event of events) {
    // Mostly it is the author who edits and sends in; otherwise few sequences would get anywhere.
    const e = 'words' in event && event.words && /edit|submit/.test(event.do) ? { ...event, who: author } : event;
    if (e.do === 'role') {
      held[e.who] = e.hold ? [e.hold] : [];
    } else if (e.do === 'another revision') {
      if (proposal.state !== 'published') revisions.push(e.over);
    } else if (e.do === 'rebase') {
      if (decide({ act: 'edit' }, actor(e.who), facts('why')).ok) stand = { ...stand, base: current() };
    } else {
      const before = proposal.state;
      const reason = e.words ? 'why' : ' ';
      const answer = decide({ act: e.do, torque: e.torque, reason } as ProposalAct, actor(e.who), facts(reason));
      if (!answer.ok) {
        if (e.do === 'publish' && /^The clamp check fails/.test(answer.why)) tally.heldBack += 1;
        continue;
      }
      const person = PEOPLE[e.who]!;
      expect(['published', 'superseded', 'declined'], 'the end is the end').not.toContain(before);
      if (e.do === 'edit' || e.do === 'submit') expect(e.who).toBe(author);
      else expect(e.who).not.toBe(author);
      if (e.do === 'edit') stand = { ...stand, text: e.text, critical: e.critical, over: e.over };
      if (e.do === 'agree' || e.do === 'publish') agreed.push({ person, words: words() });
      if (e.do === 'override') {
        expect(before).toBe('proposed');
        expect(editors(), 'an editor of this very book').toContain(person);
        expect(failing()).toContain(e.torque);
        expect(reason.trim()).not.toBe('');
        answered.push({ person, text: text(), torque: e.torque, reason });
      }
      expect(answer.overridden !== null).toBe(e.do === 'override');
      proposal = {
        state: answer.state,
        agreements: answer.agreements,
        overrides: answer.overridden ? [...proposal.overrides, answer.overridden] : proposal.overrides,
        everProposed: proposal.everProposed || answer.state === 'proposed',
      };
      if (answer.state !== 'published') continue;

      const yes = new Set(agreed.filter((a) => a.words === words()).map((a) => a.person));
      const byEditors = editors().filter((id) => yes.has(id));
      const byStandIns = editors().length === 1 ? standIns().filter((id) => yes.has(id)) : [];
      expect(before).toBe('proposed');
      expect(stand.base, 'published on the current revision').toBe(current());
      expect(editors()).toContain(person);
      expect(yes.has(PEOPLE[author]!)).toBe(false);
      if (stand.critical)
        expect(byEditors.length >= 2 || (byEditors.length === 1 && byStandIns.length >= 1)).toBe(true);
      else expect(byEditors.length).toBeGreaterThanOrEqual(1);
      for (const torque of failing()) {
        const answers = answered.filter((a) => a.text === text() && a.torque === torque && a.reason.trim() !== '');
        expect(
          answers.some((a) => a.person !== PEOPLE[author] && editors().includes(a.person)),
          `somebody answers for ${torque}`,
        ).toBe(true);
      }
      tally.published += 1;
      if (failing().length > 0) tally.overridden += 1;
    }
  }
}

describe('no sequence of acts by anybody', () => {
  it('publishes a proposal without the agreements and the overrides that it needs', () => {
    const tally = { published: 0, overridden: 0, heldBack: 0 };
    fc.assert(
      fc.property(world, (w) => play(w, tally)),
      { numRuns: 12_000 },
    );
    // The check means something only if many of the sequences get there, and many are stopped.
    expect(tally.published).toBeGreaterThan(300);
    expect(tally.overridden).toBeGreaterThan(50);
    expect(tally.heldBack).toBeGreaterThan(300);
  }, 120_000);
});
