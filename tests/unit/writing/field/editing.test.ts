import fc from 'fast-check';
import { splitBlock, toggleMark, wrapIn } from 'prosemirror-commands';
import type { Node } from 'prosemirror-model';
import { liftListItem, sinkListItem, splitListItem, wrapInList } from 'prosemirror-schema-list';
import { AllSelection, EditorState, TextSelection, type Command } from 'prosemirror-state';
import { describe, expect, it } from 'vitest';
import { EMPTY_HOLD } from '@/domain/procedure/body';
import { parseProcedure } from '@/domain/procedure/parse';
import { documentOf } from '@/domain/writing/field/fromTree';
import { insertPasted } from '@/domain/writing/field/insertPasted';
import { insertPiece } from '@/domain/writing/field/insertPiece';
import { readWords } from '@/domain/writing/field/readWords';
import { givenOf, isChip, SCHEMAS, typeOf } from '@/domain/writing/field/schema';
import { writeWords } from '@/domain/writing/field/writeWords';
import { fromPlain } from '@/domain/writing/paste/fromPlain';
import { lineOf, withBody } from '../../procedure/arbitraries';

const schema = SCHEMAS.step;
const type = (name: string) => typeOf(schema, name);
const mark = (name: string) => schema.marks[name]!;

const CHIPS = [
  '<Torque of="bolt" />',
  '<Torque of="bolt" pass="1" />',
  '<Limit of="gap" />',
  '<Part of="gasket" />',
  '<Timer of="soak" />',
];
const BLOCKS = ['<Figure of="under" />', '<Worksheet kind="readings" of="gap" />', '<Hold>Somebody looks.</Hold>'];

const BODIES = [
  '',
  `Tighten to ${CHIPS[0]}, then **${CHIPS[1]}** and *wait ${CHIPS[4]}* more.\n\n${BLOCKS[2]}`,
  `- One ${CHIPS[3]}\n- ${CHIPS[2]}\n  1. *a* **b**\n  2. [c ${CHIPS[0]}](/handbook/units) \`d\`\n\n${BLOCKS[0]}\n\nEnd.`,
  `| A | B |\n| - | -: |\n| ${CHIPS[2]} | *x* y |\n\n> Quoted ${CHIPS[0]}.\n>\n> - p\n\n${BLOCKS[1]}`,
];

const chipsOf = (document: Node): string[] => {
  const found: string[] = [];
  document.descendants((node) => {
    if (isChip(node)) found.push(JSON.stringify([node.type.name, givenOf(node)]));
  });
  return found;
};

const emptyHolds = (document: Node): boolean => {
  let found = false;
  document.descendants((node) => {
    if (node.type.name === 'Hold' && !node.textContent.trim() && chipsOf(node).length === 0) found = true;
  });
  return found;
};

const at = fc.double({ min: 0, max: 1, noNaN: true });
const range = fc.tuple(at, at);
/** Words that a paragraph may hold; a line of program at its start is refused wherever it comes from. */
const text = lineOf(40).filter((words) => !/^(import|export)\b/.test(words));

type Act = { name: string; where: [number, number]; run: (state: EditorState) => EditorState; removes?: boolean };

const command =
  (act: Command) =>
  (state: EditorState): EditorState => {
    let next = state;
    act(state, (tr) => {
      next = state.apply(tr);
    });
    return next;
  };
const put = (piece: string, stands: 'sentence' | 'block') => (state: EditorState) => {
  const tr = insertPiece(state, { text: piece, stands }, 'step');
  return tr ? state.apply(tr) : state;
};

const act: fc.Arbitrary<Act> = fc.oneof(
  fc.record({ name: fc.constant('type'), where: range, run: text.map((words) => (s: EditorState) => s.apply(s.tr.insertText(` ${words} `))), removes: fc.constant(true) }),
  fc.record({ name: fc.constant('delete'), where: range, run: fc.constant((s: EditorState) => s.apply(s.tr.deleteSelection())), removes: fc.constant(true) }),
  fc.record({ name: fc.constant('paste'), where: range, run: fc.oneof(text, fc.constantFrom('- a\n- b\n  - c', '1. x\n\ny', BODIES[1]!, BODIES[2]!)).map((words) => (s: EditorState) => s.apply(insertPasted(s, fromPlain(words, schema, 'step')))), removes: fc.constant(true) }),
  fc.record({ name: fc.constant('split'), where: at.map((n): [number, number] => [n, n]), run: fc.constantFrom(command(splitBlock), command(splitListItem(type('list_item')))) }),
  fc.record({ name: fc.constant('mark'), where: range, run: fc.constantFrom('strong', 'emphasis', 'code').map((name) => command(toggleMark(mark(name)))) }),
  fc.record({ name: fc.constant('link'), where: range, run: fc.constant(command(toggleMark(mark('link'), { href: 'https://halden.example/a_b(c)' }))) }),
  fc.record({ name: fc.constant('list'), where: range, run: fc.constantFrom('bullet_list', 'ordered_list').map((name) => command(wrapInList(type(name)))) }),
  fc.record({ name: fc.constant('quote'), where: range, run: fc.constant(command(wrapIn(type('blockquote')))) }),
  fc.record({ name: fc.constant('indent'), where: range, run: fc.constantFrom(command(sinkListItem(type('list_item'))), command(liftListItem(type('list_item')))) }),
  fc.record({ name: fc.constant('break'), where: at.map((n): [number, number] => [n, n]), run: fc.constant(command((state, dispatch) => {
    if (!state.selection.$from.parent.contentMatchAt(0).matchType(type('hard_break'))) return false;
    dispatch?.(state.tr.replaceSelectionWith(type('hard_break').create()));
    return true;
  })) }),
  fc.record({ name: fc.constant('value'), where: at.map((n): [number, number] => [n, n]), run: fc.constantFrom(...CHIPS).map((piece) => put(piece, 'sentence')) }),
  fc.record({ name: fc.constant('own'), where: at.map((n): [number, number] => [n, n]), run: fc.constantFrom(...BLOCKS).map((piece) => put(piece, 'block')) }),
); // prettier-ignore

function selected(state: EditorState, [a, b]: [number, number]): EditorState {
  const { doc } = state;
  const size = doc.content.size;
  const place = (n: number) => doc.resolve(Math.round(n * size));
  const selection = TextSelection.between(place(a), place(b));
  return state.apply(state.tr.setSelection(selection));
}

const open = (body: string): EditorState => {
  const read = readWords(body, 'step');
  if (!read.ok) throw new Error(read.problem.message);
  return EditorState.create({ doc: documentOf(read.nodes, schema) });
};

describe('whatever is done in the field', () => {
  it('gives words that a sheet can hold, and loses no value outside of what was taken away', () => {
    let longest = 0;
    fc.assert(
      fc.property(fc.constantFrom(...BODIES), fc.array(act, { minLength: 1, maxLength: 8 }), (body, acts) => {
        let state = open(body);
        for (const { where, run, removes } of acts) {
          const before = selected(state, where);
          const { from, to } = before.selection;
          const inside = before.doc.slice(from, to);
          const kept = chipsOf(before.doc);
          const taken = removes && inside.size ? chipsOf(schema.topNodeType.create(null, inside.content)) : [];
          state = run(before);
          state.doc.check();
          const now = chipsOf(state.doc);
          for (const chip of new Set(kept)) {
            const count = (all: string[]) => all.filter((one) => one === chip).length;
            expect(count(now)).toBeGreaterThanOrEqual(count(kept) - count(taken));
          }
        }
        longest = Math.max(longest, chipsOf(state.doc).length);
        const written = writeWords(state.doc, 'step');
        const parsed = parseProcedure(withBody(written));
        if (!parsed.ok) {
          expect(parsed.errors.map(({ message }) => message)).toEqual(parsed.errors.map(() => EMPTY_HOLD));
          expect(emptyHolds(state.doc)).toBe(true);
          return;
        }
        expect(parsed.procedure.steps[0]!.body).toBe(written);
        expect(chipsOf(open(written).doc)).toEqual(chipsOf(state.doc));
      }),
      { numRuns: 300 },
    );
    expect(longest).toBeGreaterThan(5);
  }, 120_000);

  it('writes the nearest that reads back where no text says what stands in the field', () => {
    const paragraph = (...content: (string | Node)[]) =>
      type('paragraph').create(
        null,
        content.map((one) => (typeof one === 'string' ? schema.text(one) : one)),
      );
    const chip = type('Torque').create({ of: 'bolt' });
    const written = (...blocks: Node[]) => writeWords(schema.topNodeType.create(null, blocks), 'step');
    expect(written(paragraph('Tighten', type('hard_break').create(), chip))).toBe('Tighten <Torque of="bolt" />');
    expect(written(paragraph('See www._c_ now'))).toBe('See `www._c_` now');
    const list = type('bullet_list').create(null, type('list_item').create(null, [paragraph('a'), paragraph('b')]));
    expect(written(list, list)).toBe('- a\n\n  b\n\n* a\n\n  b');
  });

  it('takes everything away and leaves an empty field', () => {
    const state = open(BODIES[3]!);
    const all = state.apply(state.tr.setSelection(new AllSelection(state.doc)));
    expect(writeWords(all.apply(all.tr.deleteSelection()).doc, 'step')).toBe('');
  });
});
