import { describe, expect, it } from 'vitest';
import {
  doneWords,
  headingOf,
  needed,
  sideNames,
  standingWords,
  trailWords,
  whyNotYet,
} from '@/components/review/words';
import { openQuestionWords } from '@/domain/review/openQuestions';
import { overrideMissing } from '@/domain/review/overrides';
import { AUTHOR, EDITOR, happened, proposal, SECOND } from '../../factories/proposal';

const ME = EDITOR.id;
const stands = (person: typeof EDITOR, is = true) => ({ person, at: '2026-11-29T09:00:00.000Z', stands: is });

describe('what was done', () => {
  it('is said with the word of its button, once it is so', () => {
    expect(doneWords('proposed', proposal(), ME)).toBe('Proposed.');
    expect(doneWords('agree', proposal({ agreements: 1, agreed: [stands(EDITOR)] }), ME)).toBe('Agreed, 1 of 2.');
    expect(doneWords('publish', proposal({ state: 'published', publishedLetter: 'D' }), ME)).toBe('Published as D.');
    expect(doneWords('return', proposal({ state: 'returned' }), ME)).toBe('Returned to Wren Castellan.');
    const override = { person: EDITOR, reason: 'Stretch measured', at: '2026-11-29T09:00:00.000Z' };
    const failing = { key: 'head-bolt', name: 'Head bolt', share: 1.2 };
    expect(doneWords('override', proposal({ failing: [{ ...failing, override }] }), ME)).toBe(
      'Clamp check overridden.',
    );
    expect(doneWords('override', proposal({ failing: [{ ...failing, override: null }] }), ME)).toBeNull();
    expect(doneWords('decline', proposal({ state: 'declined' }), ME)).toBe('Declined.');
  });

  it('is not said of what is not so: another state, another person, an agreement that no longer stands', () => {
    expect(doneWords('proposed', proposal({ state: 'returned' }), ME)).toBeNull();
    expect(doneWords('agree', proposal({ agreed: [stands(SECOND)] }), ME)).toBeNull();
    expect(doneWords('agree', proposal({ agreed: [stands(EDITOR, false)] }), ME)).toBeNull();
    for (const act of ['publish', 'return', 'decline'] as const) expect(doneWords(act, proposal(), ME)).toBeNull();
  });
});

it('heads a proposal with its letters where it has them', () => {
  expect(headingOf(proposal(), 'D')).toBe('Reseal the valve cover: C to D');
  expect(headingOf(proposal(), null)).toBe('Reseal the valve cover: a change to C');
  expect(headingOf(proposal({ base: null }), 'A')).toBe('Reseal the valve cover: new sheet');
});

describe('what the two texts are called', () => {
  const names = (change: Parameters<typeof proposal>[0]) => {
    const { old, now } = sideNames(proposal(change));
    return [old.pane, old.column, now.pane, now.column];
  };

  it('calls the current sheet what is worked to now', () => {
    expect(names({})).toEqual(['Published', 'Now', 'Proposed', 'Proposed']);
    expect(names({ state: 'draft' })).toEqual(['Published', 'Now', 'Draft', 'Draft']);
  });

  it('never calls an older revision so, whether the proposal is open or was declined', () => {
    for (const state of ['proposed', 'declined'] as const)
      expect(names({ state, currentLetter: 'D' })).toEqual(['Superseded', 'In C', 'Proposed', 'Proposed']);
  });

  it('tells a published change as what was before and what is now', () => {
    expect(names({ state: 'published', publishedLetter: 'D', currentLetter: 'D' })).toEqual([
      'Before',
      'Before',
      'Published',
      'Published',
    ]);
  });
});

describe('who must agree', () => {
  it('says how many, of whom, and why', () => {
    expect(needed(proposal())).toBe('Two editors must agree.');
    expect(needed(proposal({ agreementsNeeded: 1, criticalReasons: [] }))).toBe('One editor must agree.');
  });

  it('speaks of people in a shop book, where a senior technician may be the second', () => {
    const book = { kind: 'shop' as const, shopId: 'x', name: 'Hollow Road Engines' };
    expect(needed(proposal({ book }))).toMatch(/^Two people must agree/);
  });

  it('says what is missing besides the reader, whose own agreement comes with publishing', () => {
    const why = 'One more editor must agree, because a torque changes: Cover bolt.';
    const may = proposal().may;
    expect(whyNotYet({ may, whyNot: { publish: why } })).toBe(
      'Besides you, one more editor must agree, because a torque changes: Cover bolt.',
    );
    expect(whyNotYet({ may: { ...may, agree: false }, whyNot: { publish: why } })).toBe(why);
    expect(whyNotYet({ may, whyNot: {} })).toBe('');
    // Questions are told beside the button, each with the way to it.
    for (const places of [['step 2, Tighten'], ['a', 'b'], ['a', 'b', 'c', 'd']]) {
      const questions = openQuestionWords(places) ?? '';
      expect(whyNotYet({ may, whyNot: { publish: questions } })).toBe('');
      expect(whyNotYet({ may: { ...may, agree: false }, whyNot: { publish: `${why} ${questions}` } })).toBe(why);
    }
  });

  it('never says that a failed clamp check is overridden by somebody besides the reader', () => {
    const { may } = proposal();
    const fails = overrideMissing([{ name: 'Head bolt', share: 1.2 }]) ?? '';
    expect(whyNotYet({ may, whyNot: { publish: fails } })).toBe(fails);
    expect(whyNotYet({ may, whyNot: { publish: `One more editor must agree. ${fails}` } })).toBe(
      `Besides you, one more editor must agree. ${fails}`,
    );
  });
});

describe('where a proposal stands', () => {
  it('says nothing to a reviewer of what waits, for the buttons say it', () => {
    expect(standingWords(proposal(), ME)).toBeNull();
  });

  it('tells the author who it waits for', () => {
    const words = (agreements: number, agreementsNeeded = 2) =>
      standingWords(proposal({ agreements, agreementsNeeded }), AUTHOR.id);
    expect(words(0)).toMatch(/0 of 2 agreed: it waits for two to agree\.$/);
    expect(words(1)).toMatch(/1 of 2 agreed: it waits for one more to agree\.$/);
    expect(words(1, 1)).toMatch(/it waits for an editor to publish it\.$/);
  });

  it('names who gave it back and when, and says "you" to that person', () => {
    const trail = [
      happened('proposed', AUTHOR, 27),
      happened('returned', SECOND, 28),
      happened('returned', EDITOR, 29),
    ];
    const returned = proposal({ state: 'returned', trail });
    expect(standingWords(returned, ME)).toBe('Returned by you on 29 Nov 2026. It waits for its author.');
    expect(standingWords(returned, AUTHOR.id)).toBe(
      'Returned by Otto Lindqvist on 29 Nov 2026. It waits for you: change it and send it in again.',
    );
    expect(standingWords(proposal({ state: 'declined', trail: [happened('declined', EDITOR, 30)] }), SECOND.id)).toBe(
      'Declined by Otto Lindqvist on 30 Nov 2026. It stays here as a record.',
    );
  });

  it('names those whose agreement stood when it was published', () => {
    const published = proposal({
      state: 'published',
      publishedLetter: 'D',
      agreed: [stands(EDITOR), stands(SECOND), stands({ ...SECOND, id: 'third', name: 'Gone Since' }, false)],
      trail: [happened('published', EDITOR, 30)],
    });
    expect(standingWords(published, ME)).toBe('Published as D on 30 Nov 2026, agreed by you and Maeve Sorrel.');
    expect(standingWords({ ...published, state: 'superseded' }, 'somebody')).toBe(
      'Published as D on 30 Nov 2026, agreed by Otto Lindqvist and Maeve Sorrel. A later revision has taken its place.',
    );
  });

  it('keeps a draft to its author', () => {
    expect(standingWords(proposal({ state: 'draft' }), AUTHOR.id)).toMatch(/^A draft\. Nobody else sees it/);
  });
});

it('tells a second sending-in as what it is, and a publication with its letter', () => {
  const trail = [
    happened('proposed', AUTHOR, 26),
    happened('returned', EDITOR, 27),
    happened('proposed', AUTHOR, 28),
    happened('published', EDITOR, 29),
  ];
  expect(trailWords(trail, 'D').map(({ words }) => words)).toEqual([
    'proposed',
    'returned',
    'improved and proposed again',
    'published as D',
  ]);
});
