import { describe, expect, it } from 'vitest';
import {
  type Act,
  type Actor,
  may,
  type Membership,
  type ProposalSubject,
  type Role,
  type Subjects,
} from '@/domain/people/may';

const HERE = 'shop-here';
const THERE = 'shop-there';
const person = (...memberships: Membership[]): Actor => ({ personId: 'me', memberships });
const inShop = (role: Exclude<Role, 'steward'>, shopId = HERE): Membership => ({ in: 'shop', shopId, role });
const COMMON_EDITOR: Membership = { in: 'common', role: 'editor' };
const STEWARD: Membership = { in: 'network', role: 'steward' };

const PEOPLE = {
  apprentice: person(inShop('apprentice')),
  technician: person(inShop('technician')),
  senior: person(inShop('senior')),
  editor: person(inShop('editor')),
  owner: person(inShop('owner')),
  'common editor': person(COMMON_EDITOR),
  steward: person(STEWARD),
  nobody: person(),
};
type Who = keyof typeof PEOPLE;
const ALL = Object.keys(PEOPLE) as Who[];

const common = { kind: 'common' } as const;
const here = { kind: 'shop', shopId: HERE } as const;
const there = { kind: 'shop', shopId: THERE } as const;
const proposal = (change: Partial<ProposalSubject>): ProposalSubject => ({
  book: common,
  authorId: 'somebody else',
  everProposed: true,
  critical: false,
  editors: 2,
  ...change,
});

/** Y may; n is refused openly (403); . is hidden (404). One mark a person, in the order of ALL. */
type Row<A extends Act = Act> = [what: string, marks: string, act: A, subject: Subjects[A]];
const row = <A extends Act>(...cells: Row<A>) => cells as unknown as Row;
//                                                       apprentice, technician, senior, editor, owner, common editor, steward, nobody
const TABLE: Row[] = [
  row('read the common book', 'YYYYYYY.', 'readBook', { book: common }),
  row("read the shop's own book", 'YYYYY...', 'readBook', { book: here }),
  row("read another shop's book", '........', 'readBook', { book: there }),
  row('copy a common sheet into the common book', 'nYYYYYn.', 'copySheet', { from: common, to: common }),
  row('copy a common sheet into the shop', 'nYYYY...', 'copySheet', { from: common, to: here }),
  row("copy the shop's own sheet within the shop", 'nYYYY...', 'copySheet', { from: here, to: here }),
  row("copy the shop's own sheet into the common book", 'nnnYY...', 'copySheet', { from: here, to: common }),
  row("copy another shop's sheet", '........', 'copySheet', { from: there, to: here }),
  row("copy the shop's own sheet into another shop", '........', 'copySheet', { from: here, to: there }),
  row('flag a common sheet', 'YYYYYYY.', 'flag', { book: common }),
  row('flag a sheet of the shop', 'YYYYY...', 'flag', { book: here }),
  row("flag another shop's sheet", '........', 'flag', { book: there }),
  row('answer a flag on a common sheet from here', '..YYYY..', 'answerFlag', {
    book: common,
    raisedBy: 'x',
    raiserShops: [HERE],
  }),
  row('answer a flag on a common sheet from another shop', '.....Y..', 'answerFlag', {
    book: common,
    raisedBy: 'x',
    raiserShops: [THERE],
  }),
  row('answer a flag on a sheet of the shop', '..YYY...', 'answerFlag', { book: here, raisedBy: 'x', raiserShops: [] }),
  row("answer a flag on another shop's sheet", '........', 'answerFlag', {
    book: there,
    raisedBy: 'x',
    raiserShops: [HERE],
  }),
  row('answer their own flag', 'nnnnnnn.', 'answerFlag', { book: common, raisedBy: 'me', raiserShops: [HERE] }),
  row('run a job card here', 'YYYYY...', 'runJobCard', { shopId: HERE, book: common }),
  row("run a job card here on another shop's sheet", '........', 'runJobCard', { shopId: HERE, book: there }),
  row('run a job card there', '........', 'runJobCard', { shopId: THERE, book: common }),
  row('sign an ordinary step here', 'YYYYY...', 'signStep', { shopId: HERE }),
  row('sign a step there', '........', 'signStep', { shopId: THERE }),
  row('propose to the common book', 'nYYYYYn.', 'propose', { book: common }),
  row("propose to the shop's book", 'nYYYY...', 'propose', { book: here }),
  row("propose to another shop's book", '........', 'propose', { book: there }),
  row('witness a hold point here', 'nnYYY...', 'witness', { shopId: HERE, signedBy: 'somebody else' }),
  row('witness their own step', 'nnnnn...', 'witness', { shopId: HERE, signedBy: 'me' }),
  row('witness a hold point there', '........', 'witness', { shopId: THERE, signedBy: 'somebody else' }),
  row('write a supplement here', 'nnYYY...', 'writeSupplement', { shopId: HERE }),
  row('write a supplement there', '........', 'writeSupplement', { shopId: THERE }),
  row('look after the people here', 'nnnnY.Y.', 'manageMembers', { shopId: HERE }),
  row('look after the people there', '......Y.', 'manageMembers', { shopId: THERE }),
  row('read the settings of the shop', 'YYYYY.Y.', 'readShopSettings', { shopId: HERE }),
  row('read the settings of another shop', '......Y.', 'readShopSettings', { shopId: THERE }),
  row('change the settings of the shop', 'nnnnY.Y.', 'changeShopSettings', { shopId: HERE }),
  row('change the settings of another shop', '......Y.', 'changeShopSettings', { shopId: THERE }),
  row('look after shops and common editors', 'nnnnnnYn', 'manageShops', null),
  row('read the audit trail', 'nnnnnnYn', 'readAudit', null),
  row('read the audit trail of the shop', 'nnnnY.Y.', 'readShopAudit', { shopId: HERE }),
  row('read the audit trail of another shop', '......Y.', 'readShopAudit', { shopId: THERE }),
  ...(['withdraw', 'bringBack'] as const).flatMap((act) => [
    row(`${act} a common sheet`, 'nnnnnYn.', act, { book: common }),
    row(`${act} a sheet of the shop`, 'nnnYn...', act, { book: here }),
    row(`${act} another shop's sheet`, '........', act, { book: there }),
  ]),
  row('see the review desk', 'nnnYnYnn', 'seeReviewDesk', { shopsWithOneEditor: [] }),
  row('see it where the shop has one editor', 'nnYYYYnn', 'seeReviewDesk', { shopsWithOneEditor: [HERE] }),
  row('see it where another shop has one editor', 'nnnYnYnn', 'seeReviewDesk', { shopsWithOneEditor: [THERE] }),

  row('read a common proposal', 'YYYYYYY.', 'readProposal', proposal({})),
  row("read somebody's common draft", '........', 'readProposal', proposal({ everProposed: false })),
  row('read a proposal here', 'YYYYY...', 'readProposal', proposal({ book: here })),
  row('read a proposal there', '........', 'readProposal', proposal({ book: there })),
  row('read their own common draft', 'YYYYYYY.', 'readProposal', proposal({ authorId: 'me', everProposed: false })),
  row('read their own draft there', '........', 'readProposal', proposal({ authorId: 'me', book: there })),
  ...(['editProposal', 'submit'] as const).flatMap((act) => [
    row(`${act} their own, common`, 'nYYYYYn.', act, proposal({ authorId: 'me', everProposed: false })),
    row(`${act} their own, here`, 'nYYYY...', act, proposal({ authorId: 'me', book: here })),
    row(`${act} their own, there`, '........', act, proposal({ authorId: 'me', book: there })),
    row(`${act} another's, common`, 'nnnnnnn.', act, proposal({})),
    row(`${act} another's, here`, 'nnnnn...', act, proposal({ book: here })),
    row(`${act} another's draft`, '........', act, proposal({ everProposed: false })),
  ]),
  ...(['return', 'decline', 'agree', 'override', 'publish'] as const).flatMap((act) => [
    row(`${act}, common`, 'nnnnnYn.', act, proposal({})),
    row(`${act}, common, critical`, 'nnnnnYn.', act, proposal({ critical: true, editors: 1 })),
    row(`${act}, here`, 'nnnYn...', act, proposal({ book: here })),
    row(`${act}, here, critical, two editors`, 'nnnYn...', act, proposal({ book: here, critical: true })),
    row(
      `${act}, here, critical, one editor`,
      act === 'agree' ? 'nnYYY...' : 'nnnYn...',
      act,
      proposal({ book: here, critical: true, editors: 1 }),
    ),
    row(`${act}, here, ordinary, one editor`, 'nnnYn...', act, proposal({ book: here, editors: 1 })),
    row(`${act}, there`, '........', act, proposal({ book: there, critical: true, editors: 1 })),
    row(`${act} a draft`, '........', act, proposal({ everProposed: false })),
    row(`${act} their own, common`, 'nnnnnnn.', act, proposal({ authorId: 'me' })),
    row(
      `${act} their own, here`,
      'nnnnn...',
      act,
      proposal({ authorId: 'me', book: here, critical: true, editors: 1 }),
    ),
  ]),
];

describe('who may do what', () => {
  for (const [what, marks, act, subject] of TABLE)
    it.each(ALL.map((who, i) => [who, marks[i]] as const))(`${what}: %s %s`, (who, mark) => {
      const answer = may(PEOPLE[who], act, subject);
      expect(answer.ok ? 'Y' : answer.visible ? 'n' : '.').toBe(mark);
      if (!answer.ok) expect(answer.why).toMatch(/^[A-Z].*\.$/);
    });

  it('adds up the roles that a person holds', () => {
    const both = person(inShop('apprentice', THERE), inShop('editor'), inShop('owner'));
    expect(may(both, 'publish', proposal({ book: here })).ok).toBe(true);
    expect(may(both, 'manageMembers', { shopId: HERE }).ok).toBe(true);
    expect(may(both, 'publish', proposal({ book: there }))).toMatchObject({ ok: false, visible: true });
    expect(may(both, 'publish', proposal({}))).toMatchObject({ ok: false, visible: true });
    expect(may(person(STEWARD, inShop('apprentice')), 'runJobCard', { shopId: HERE, book: here }).ok).toBe(true);
  });

  it('hides with the same words as what does not exist', () => {
    const words = TABLE.flatMap(([, , act, subject]) =>
      ALL.map((who) => may(PEOPLE[who], act, subject)).flatMap((a) => (a.ok || a.visible ? [] : [a.why])),
    );
    expect(new Set(words)).toEqual(new Set(['There is no such thing here, or it is not yours to see.']));
  });

  it.each<[Actor, Act, unknown, string]>([
    [
      PEOPLE.apprentice,
      'propose',
      { book: common },
      'A technician, senior technician, editor or owner proposes a change.',
    ],
    [
      PEOPLE['common editor'],
      'agree',
      proposal({ authorId: 'me' }),
      'You wrote this proposal. Nobody agrees to their own.',
    ],
    [PEOPLE.technician, 'publish', proposal({}), 'Only an editor of the common book publishes a proposal.'],
    [PEOPLE.owner, 'return', proposal({ book: here }), "Only this shop's editor returns a proposal."],
    [
      PEOPLE.senior,
      'witness',
      { shopId: HERE, signedBy: 'me' },
      'You signed this step, so somebody else must witness it.',
    ],
  ])('says why', (actor, act, subject, why) => {
    expect(may(actor, act, subject as Subjects[Act])).toEqual({ ok: false, visible: true, why });
  });
});

it("keeps a shop's own sheet out of another shop, also for somebody who is editor and owner of both", () => {
  const both = person(inShop('editor'), inShop('owner'), inShop('editor', THERE), inShop('owner', THERE));
  expect(may(both, 'copySheet', { from: here, to: there })).toMatchObject({ ok: false, visible: true });
  expect(may(both, 'copySheet', { from: here, to: here })).toEqual({ ok: true });
});
