import { describe, expect, it } from 'vitest';
import { freeSlug, provisionalId, settledId, slugOf } from '@/domain/writing/ids';
import { insertAt, inserted } from '@/domain/writing/insert';
import { readNumber, readNumbers } from '@/domain/writing/numbers';
import { readDraft } from '@/domain/writing/readDraft';
import { besideField, headProblems, problemAt } from '@/domain/writing/problems';
import { procedureOf } from '@/domain/writing/procedureOf';
import { keysIn, placeOfPath, usesInWords } from '@/domain/writing/uses';
import { Key } from '@/domain/procedure/schema';
import { readFileSync } from 'node:fs';

const draft = () => readDraft(readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8'))!;

describe('ids', () => {
  it.each([
    ['Draw the cover down in two passes', 'draw-the-cover-down-in-two-passes'],
    ['  Évenly, 2× (all)! ', 'evenly-2-all'],
    ['3 bolts', 'bolts'],
    ['漢字', 'step'],
    ['A'.repeat(80), 'a'.repeat(40)],
  ])('%s', (title, id) => {
    expect(slugOf(title, 'step')).toBe(id);
    expect(Key.safeParse(id).success).toBe(true);
  });

  it('is never taken twice, however long', () => {
    const taken = ['lift', 'lift-2', 'b'.repeat(40)];
    expect(freeSlug('Lift', taken, 'step')).toBe('lift-3');
    expect(freeSlug('b'.repeat(40), taken, 'step')).toBe(`${'b'.repeat(38)}-2`);
  });

  it('settles with the first title and then stays', () => {
    const id = provisionalId(['new-step']);
    expect(id).toBe('new-step-2');
    expect(settledId(id, ' ', [id])).toBe(id);
    expect(settledId(id, 'Lift the cover', [id, 'lift-the-cover'])).toBe('lift-the-cover-2');
    expect(settledId('lift', 'Something else', ['lift'])).toBe('lift');
  });
});

describe('insertion at the caret', () => {
  const torque = { text: '<Torque of="a" />', stands: 'sentence' } as const;
  const figure = { text: '<Figure of="a" />', stands: 'block' } as const;
  const put = (marked: string, piece: Parameters<typeof insertAt>[1]) => {
    const start = marked.indexOf('|');
    const caret = { text: marked.replace('|', ''), start, end: start };
    const insertion = insertAt(caret, piece);
    const text = inserted(caret, insertion);
    return `${text.slice(0, insertion.start)}|${text.slice(insertion.start)}`;
  };
  it.each([
    ['Tighten to |.', 'Tighten to <Torque of="a" />|.'],
    ['Tighten to|then', 'Tighten to <Torque of="a" /> |then'],
    ['|', '<Torque of="a" />|'],
    ['(|)', '(<Torque of="a" />|)'],
  ])('in a sentence: %s', (marked, expected) => expect(put(marked, torque)).toBe(expected));
  it.each([
    ['', '<Figure of="a" />|'],
    ['Look.', 'Look.\n\n<Figure of="a" />|'],
    ['Look.\n', 'Look.\n\n<Figure of="a" />|'],
    ['Look.\n\n', 'Look.\n\n<Figure of="a" />|'],
  ])('on its own: %j', (before, expected) => expect(put(`${before}|`, figure)).toBe(expected));
  it('moves the words behind it into a paragraph of their own', () =>
    expect(put('Look.| Then go on.', figure)).toBe('Look.\n\n<Figure of="a" />|\n\n Then go on.'));
  it('selects what is to be written over', () => {
    const { start, end } = insertAt(
      { text: '', start: 0, end: 0 },
      { text: '<Hold>Say what.</Hold>', stands: 'block', select: 'Say what.' },
    );
    expect('<Hold>Say what.</Hold>'.slice(start, end)).toBe('Say what.');
  });
});

describe('numbers', () => {
  it.each([
    ['10', 10],
    [' 10,5 ', 10.5],
    ['.5', 0.5],
    ['−3', -3],
    ['1e3', '1e3'],
    ['10 N·m', '10 N·m'],
    ['1,000.5', '1,000.5'],
    ['', ''],
  ])('%j', (text, value) => expect(readNumber(text)).toBe(value));
  it('reads several', () => {
    expect(readNumbers('3 8; 2\n7, 4')).toEqual([3, 8, 2, 7, 4]);
    expect(readNumbers('97,5 150')).toEqual([97.5, 150]);
  });
});

describe('uses', () => {
  it('finds what a text points at', () => {
    const body =
      '<Torque of="a" pass="1" /> <Torque of="a" /> <Worksheet kind="readings" of="x y" /> <Timer of="s" stage="cure" />';
    expect(keysIn(body, 'torques')).toEqual(['a']);
    expect(keysIn(body, 'limits')).toEqual(['x', 'y']);
    expect(keysIn(body, 'timers')).toEqual([]);
    expect(keysIn(body, 'supplies')).toEqual(['s']);
  });
  it('says where, in words', () => {
    expect(usesInWords(draft(), 'cautions', 'hot-oil')).toBe('steps 1 and 11');
    expect(usesInWords(draft(), 'sources', 'demo')).toBe('2 torques and 2 limits');
    expect(usesInWords(draft(), 'tools', 'air')).toBe('');
  });
  it('leads from a problem to its place', () => {
    expect(placeOfPath('steps.3.body')).toEqual({ step: 3 });
    expect(placeOfPath('torques.0.nm')).toEqual({ list: 'torques' });
    expect(placeOfPath('engines.0')).toBe('sheet');
  });
});

describe('problems', () => {
  it('stand beside their field, in the words of the check', () => {
    const typed = draft();
    typed.torques[0]!['nm'] = 'ten';
    typed.torques[0]!['passes'] = '11;';
    typed.limits[0]!['unit'] = '';
    const problems = headProblems(procedureOf(typed));
    expect(problemAt(problems, 'torques.0.nm')).toBe('Torque in N·m must be a number; "ten" is text.');
    expect(problemAt(problems, 'limits.0.unit')).toContain('is missing');
    expect(problemAt(problems, 'torques.1.nm')).toBeUndefined();
  });
  it('leave out the entry they stand in', () =>
    expect(besideField('Torque 1 (Cover bolt (M6)): tolerance must be smaller.')).toBe('Tolerance must be smaller.'));
});
