import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Actor, Membership, Role } from '@/domain/people/may';
import { completions, mentionsIn, nameBeingTyped, runsOf } from '@/domain/review/mentions';
import { canPublish, type ProposalFacts } from '@/domain/review/rules';
import {
  isAnswered,
  mayAccept,
  mayReopen,
  mayReply,
  mayResolve,
  mayStart,
  type ThreadFacts,
} from '@/domain/review/threads';
import { factsOf } from '../../factories/facts';

const inShop = (shopId: string, role: Exclude<Role, 'steward'>): Membership => ({ in: 'shop', shopId, role });
const who = (personId: string, ...memberships: Membership[]): Actor => ({ personId, memberships });
const author = who('author', inShop('north', 'technician'));
const technician = who('technician', inShop('pier', 'technician'));
const apprentice = who('apprentice', inShop('north', 'apprentice'));
const steward = who('steward', { in: 'network', role: 'steward' });
const editor = who('editor', { in: 'common', role: 'editor' });
const other = who('other', { in: 'common', role: 'editor' });

const facts = (change: Partial<ProposalFacts> = {}) =>
  factsOf({
    authorId: 'author',
    hash: 'h',
    base: 'A',
    current: 'A',
    reason: 'why',
    agreements: [{ personId: 'editor', hash: 'h', base: 'A' }],
    editorIds: ['editor', 'other'],
    ...change,
  });
const thread = (change: Partial<ThreadFacts> = {}): ThreadFacts => ({
  kind: 'question',
  personId: 'editor',
  state: 'open',
  accepted: false,
  writers: ['editor'],
  openedAt: 1,
  suggestion: null,
  ...change,
});
const value = { kind: 'value', from: 10, to: 11, fromText: '10 N·m', toText: '11 N·m' } as const;
const kindOf = (verdict: { ok: true } | { ok: false; kind: string }) => (verdict.ok ? 'ok' : verdict.kind);

describe('who takes part', () => {
  it('is the author and whoever sees the text and may propose in its book', () => {
    const start = (actor: Actor, change?: Partial<ProposalFacts>) => kindOf(mayStart(actor, facts(change), 'question'));
    expect([author, technician, editor, apprentice, steward].map((a) => start(a))).toEqual([
      'ok',
      'ok',
      'ok',
      'forbidden',
      'forbidden',
    ]);
    const shop = { book: { kind: 'shop', shopId: 'north' } } as const;
    expect(start(technician, shop)).toBe('hidden');
    expect(start(editor, shop)).toBe('hidden');
    expect(start(technician, { everProposed: false, state: 'draft' })).toBe('hidden');
    expect(start(author, { everProposed: false, state: 'draft' })).toBe('conflict');
    expect(start(editor, { state: 'returned' })).toBe('ok');
    for (const state of ['published', 'superseded', 'declined'] as const) {
      expect(start(editor, { state })).toBe('conflict');
      expect(kindOf(mayReply(editor, facts({ state })))).toBe('conflict');
    }
    expect(kindOf(mayStart(author, facts(), 'suggestion'))).toBe('forbidden');
  });

  it('resolves a question only with an answer, and never as its author', () => {
    const answered = thread({ writers: ['editor', 'author'] });
    expect(kindOf(mayResolve(editor, facts(), thread()))).toBe('conflict');
    expect(kindOf(mayResolve(editor, facts(), thread({ writers: ['editor', 'editor'] })))).toBe('conflict');
    expect([editor, other, author, technician].map((a) => kindOf(mayResolve(a, facts(), answered)))).toEqual([
      'ok',
      'ok',
      'forbidden',
      'forbidden',
    ]);
    const again = thread({ writers: ['editor', 'author'], openedAt: 2 });
    expect(kindOf(mayResolve(editor, facts(), again)), 'opened again, it wants another answer').toBe('conflict');
    const remark = thread({ kind: 'remark', personId: 'technician', writers: ['technician'] });
    expect(
      [author, editor, technician, who('x', inShop('pier', 'senior'))].map((a) =>
        kindOf(mayResolve(a, facts(), remark)),
      ),
    ).toEqual(['ok', 'ok', 'ok', 'forbidden']);
    expect(kindOf(mayReopen(technician, facts(), thread({ state: 'resolved' })))).toBe('ok');
    expect(kindOf(mayReopen(technician, facts(), thread()))).toBe('conflict');
  });

  it('lets the author alone accept, once, while the text is theirs to change', () => {
    const suggestion = thread({ kind: 'suggestion', suggestion: value });
    const returned = facts({ state: 'returned' });
    expect(kindOf(mayAccept(author, returned, suggestion))).toBe('ok');
    expect(kindOf(mayAccept(editor, returned, suggestion))).toBe('forbidden');
    expect(mayAccept(author, facts(), suggestion)).toMatchObject({
      kind: 'conflict',
      why: expect.stringContaining('once the text is returned to you') as string,
    });
    const taken = thread({ kind: 'suggestion', suggestion: value, state: 'resolved', accepted: true });
    expect(kindOf(mayAccept(author, returned, taken))).toBe('conflict');
    expect(kindOf(mayReopen(editor, returned, taken)), 'so it cannot be accepted a second time').toBe('conflict');
    expect(kindOf(mayAccept(author, returned, thread()))).toBe('conflict');
  });

  it('answers a question by anybody but who asked it, after it was last opened', () => {
    const people = fc.constantFrom('editor', 'author', 'technician');
    fc.assert(
      fc.property(fc.array(people, { maxLength: 6 }), fc.nat(6), (replies, opened) => {
        const writers = ['editor', ...replies];
        const openedAt = Math.max(1, Math.min(opened, writers.length));
        let expected = false;
        writers.forEach((writer, i) => {
          if (i >= openedAt && writer !== 'editor') expected = true;
        });
        expect(isAnswered({ writers, openedAt, personId: 'editor' })).toBe(expected);
      }),
    );
  });
});

it('holds publishing up exactly as long as a question is open, and names where', () => {
  fc.assert(
    fc.property(fc.array(fc.constantFrom('step 4, Fit the cover', 'Cover bolt'), { maxLength: 7 }), (openQuestions) => {
      const verdict = canPublish(facts({ openQuestions }));
      expect(verdict.ok).toBe(openQuestions.length === 0);
      if (!verdict.ok) expect(verdict.why).toContain(openQuestions[0]);
    }),
  );
  expect(canPublish(facts({ openQuestions: ['Cover bolt'] }))).toEqual({
    ok: false,
    why: 'A question on Cover bolt is still open. It must be answered and resolved first.',
  });
  expect(canPublish(facts({ openQuestions: ['a', 'b', 'c', 'd', 'e'], agreements: [] }))).toEqual({
    ok: false,
    why: 'An editor must agree. 5 questions are still open: on a; on b; on c; and 2 more. They must be answered and resolved first.',
  });
});

describe('a name in a message', () => {
  const people = [
    { id: '1', name: 'Otto Lind' },
    { id: '2', name: 'Otto Lindqvist' },
    { id: '3', name: 'Maeve Sorrel' },
  ];
  it('is found whole, the longer one first, and not inside of a word', () => {
    const named = (text: string) => mentionsIn(text, people).map(({ id }) => id);
    expect(named('@Otto Lindqvist, and @maeve sorrel.')).toEqual(['2', '3']);
    expect(named('@Otto Lind: see a@Maeve Sorrel')).toEqual(['1']);
    expect(named('@Otto Lindq, @Otto Lind @Otto Lind')).toEqual(['1']);
  });

  it('cuts a message without losing a letter', () => {
    const piece = fc.constantFrom('@', 'Otto Lind', 'qvist', ' ', 'Maeve Sorrel', 'x', '🙂');
    fc.assert(
      fc.property(fc.array(piece), (pieces) => {
        const text = pieces.join('');
        const runs = runsOf(text, people);
        expect(runs.map((run) => run.text).join('')).toBe(text);
        for (const { text: run, person } of runs)
          if (person) expect(run.toLowerCase()).toBe(`@${person.name.toLowerCase()}`);
      }),
    );
  });

  it('is completed while it is typed', () => {
    expect(nameBeingTyped('Ask @Ott', 8)).toBe('Ott');
    expect(nameBeingTyped('Ask @', 5)).toBe('');
    expect(nameBeingTyped('mail a@b', 8)).toBeNull();
    expect(nameBeingTyped('@Maeve Sor and', 10)).toBe('Maeve Sor');
    expect(completions('sor', people).map(({ id }) => id)).toEqual(['3']);
    expect(completions('otto', people).map(({ id }) => id)).toEqual(['1', '2']);
  });
});
