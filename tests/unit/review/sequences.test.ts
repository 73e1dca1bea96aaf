import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Actor, Book, Membership } from '@/domain/people/may';
import { decide, type ProposalAct } from '@/domain/review/decide';
import type { ProposalFacts } from '@/domain/review/rules';

const SHOP = 'pier';
const PEOPLE = ['a', 'b', 'c', 'd'];

type Hold = Extract<Membership, { in: 'shop' }>['role'] | 'common' | 'steward';
type Event =
  | { do: ProposalAct['act']; who: number; words: boolean; text: number; critical: boolean }
  | { do: 'role'; who: number; hold: Hold }
  | { do: 'another revision' }
  | { do: 'rebase'; who: number };

const who = fc.nat(PEOPLE.length - 1);
const act = fc.record({
  do: fc.constantFrom<ProposalAct['act'][]>(
    'edit',
    'submit',
    'submit',
    'return',
    'decline',
    'agree',
    'agree',
    'publish',
    'publish',
  ),
  who,
  words: fc.boolean(),
  text: fc.nat(2),
  critical: fc.boolean(),
});
const hold = fc.constantFrom<Hold[]>(
  'apprentice',
  'technician',
  'senior',
  'editor',
  'editor',
  'owner',
  'common',
  'common',
  'steward',
);
const event: fc.Arbitrary<Event> = fc.oneof(
  { weight: 20, arbitrary: act },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('role' as const), who, hold }) },
  { weight: 1, arbitrary: fc.constant({ do: 'another revision' as const }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('rebase' as const), who }) },
);
const world = fc.record({
  book: fc.constantFrom<Book[]>({ kind: 'common' }, { kind: 'shop', shopId: SHOP }),
  author: who,
  critical: fc.boolean(),
  holds: fc.array(
    fc.oneof({ weight: 3, arbitrary: fc.constant('editor of the book' as const) }, { weight: 2, arbitrary: hold }),
    {
      minLength: PEOPLE.length,
      maxLength: PEOPLE.length,
    },
  ),
  events: fc.array(event, { minLength: 15, maxLength: 60 }),
});
type World = typeof world extends fc.Arbitrary<infer T> ? T : never;

const membership = (held: Hold): Membership =>
  held === 'common'
    ? { in: 'common', role: 'editor' }
    : held === 'steward'
      ? { in: 'network', role: 'steward' }
      : { in: 'shop', shopId: SHOP, role: held };

/**
 * Plays a world and keeps a plain diary beside it, which knows nothing of the rules' own bookkeeping: who said yes to
 * which words. Returns the number of times that something was published.
 */
function play({ book, author, critical, holds, events }: World): number {
  const held = holds.map((h): Hold => (h !== 'editor of the book' ? h : book.kind === 'common' ? 'common' : 'editor'));
  const actor = (i: number): Actor => ({ personId: PEOPLE[i]!, memberships: [membership(held[i]!)] });
  const holding = (...roles: Hold[]) => PEOPLE.filter((_, i) => roles.includes(held[i]!));
  const editors = () => (book.kind === 'common' ? holding('common') : holding('editor'));
  const standIns = () => (book.kind === 'common' ? [] : holding('senior', 'owner'));
  const diary: { person: string; words: string }[] = [];
  let current = 0;
  let stand = { base: 0, text: 0, critical };
  let proposal: Pick<ProposalFacts, 'state' | 'agreements' | 'everProposed'> = {
    state: 'draft',
    agreements: [],
    everProposed: false,
  };
  const words = () => `${stand.text} ${stand.critical} on ${stand.base}`;
  const facts = (reason: string): ProposalFacts => ({
    ...proposal,
    book,
    authorId: PEOPLE[author]!,
    hash: `${stand.text} ${stand.critical}`,
    base: String(stand.base),
    current: String(current),
    identical: false,
    reason,
    criticalReasons: stand.critical ? ['a torque changes: Cover bolt'] : [],
    editorIds: editors(),
    standInIds: standIns(),
  });

  for (const drawn of events) {
    // Mostly it is the author who edits and sends in; otherwise few sequences would get anywhere.
    const e = 'words' in drawn && drawn.words && /edit|submit/.test(drawn.do) ? { ...drawn, who: author } : drawn;
    if (e.do === 'role') {
      held[e.who] = e.hold;
    } else if (e.do === 'another revision') {
      if (proposal.state !== 'published') current += 1;
    } else if (e.do === 'rebase') {
      if (decide({ act: 'edit' }, actor(e.who), facts('why')).ok) stand = { ...stand, base: current };
    } else {
      const before = proposal.state;
      const reason = e.words ? 'why' : '';
      const answer = decide({ act: e.do, reason } as ProposalAct, actor(e.who), facts(reason));
      if (!answer.ok) continue;
      const person = PEOPLE[e.who]!;
      expect(['published', 'superseded', 'declined'], 'the end is the end').not.toContain(before);
      if (e.do === 'edit' || e.do === 'submit') expect(e.who).toBe(author);
      else expect(e.who).not.toBe(author);
      if (e.do === 'edit') stand = { ...stand, text: e.text, critical: e.critical };
      if (e.do === 'agree' || e.do === 'publish') diary.push({ person, words: words() });
      proposal = {
        state: answer.state,
        agreements: answer.agreements,
        everProposed: proposal.everProposed || answer.state === 'proposed',
      };
      if (answer.state !== 'published') continue;

      const yes = new Set(diary.filter((d) => d.words === words()).map((d) => d.person));
      const byEditors = editors().filter((id) => yes.has(id));
      const byStandIns = editors().length === 1 ? standIns().filter((id) => yes.has(id)) : [];
      expect(before).toBe('proposed');
      expect(stand.base, 'published on the current revision').toBe(current);
      expect(editors()).toContain(person);
      expect(yes.has(PEOPLE[author]!)).toBe(false);
      if (stand.critical)
        expect(byEditors.length >= 2 || (byEditors.length === 1 && byStandIns.length >= 1)).toBe(true);
      else expect(byEditors.length).toBeGreaterThanOrEqual(1);
    }
  }
  return proposal.state === 'published' ? 1 : 0;
}

describe('no sequence of acts by anybody', () => {
  it('publishes a proposal without the agreements that it needs', () => {
    let published = 0;
    fc.assert(
      fc.property(world, (w) => {
        published += play(w);
      }),
      { numRuns: 12_000 },
    );
    // The check means something only if many of the sequences get there.

    expect(published).toBeGreaterThan(300);
  });
});
