import type { Fragment, Node, ResolvedPos } from 'prosemirror-model';
import { NodeSelection, Selection, TextSelection, type EditorState, type Transaction } from 'prosemirror-state';
import type { Piece } from '../insert';
import { piecesOf } from './fromTree';
import { readWords } from './readWords';
import { isChip, typeOf, type Where } from './schema';

/** No word and no value. */
const isBlank = (content: Fragment) =>
  content.textBetween(0, content.size, '', (node) => (isChip(node) ? 'x' : ' ')).trim() === '';

const signAt = ($pos: ResolvedPos, offset: number): string => {
  const at = $pos.parentOffset + offset;
  return at < 0 || at >= $pos.parent.content.size ? '' : $pos.parent.textBetween(at, at + 1, undefined, '\ufffc');
};

/** Behind the passage that the selection ends in. */
const endOfTop = ({ $to, to }: Selection): number => ($to.depth >= 1 ? $to.after(1) : to);

/** A value among the words, with a blank where it would touch one. */
function intoSentence(state: EditorState, chip: Node): Transaction {
  const { tr, schema, selection } = state;
  const { $from, $to } = selection;
  if (!$from.parent.inlineContent || $from.parent !== $to.parent) {
    const at = endOfTop(selection);
    tr.insert(at, typeOf(schema, 'paragraph').create(null, chip));
    return tr.setSelection(TextSelection.create(tr.doc, at + 2));
  }
  const marks = (state.storedMarks ?? $from.marks()).filter((mark) => mark.type.name !== 'code');
  const left = /[^\s(“"'‘/-]/.test(signAt($from, -1)) ? [schema.text(' ', marks)] : [];
  const right = /[\p{L}\p{N}(]/u.test(signAt($to, 0)) ? [schema.text(' ', marks)] : [];
  const pieces = [...left, chip.mark(marks), ...right];
  const end = $from.pos + pieces.reduce((size, piece) => size + piece.nodeSize, 0);
  tr.replaceWith($from.pos, $to.pos, pieces);
  return tr.setSelection(TextSelection.create(tr.doc, end));
}

/** A drawing, worksheet or hold point on its own; the words behind the caret go on in a paragraph after it. */
function onItsOwn(state: EditorState, block: Node): Transaction {
  const { tr, schema, selection } = state;
  const { $from, $to } = selection;
  const paragraph = typeOf(schema, 'paragraph');
  const top = $from.depth >= 1 ? $from.node(1) : null;
  let at: number;
  if (top?.type === paragraph && $to.depth >= 1 && $to.node(1) === top) {
    const before = top.content.cut(0, $from.parentOffset);
    const after = top.content.cut($to.parentOffset);
    const ahead = isBlank(before) ? [] : [paragraph.create(null, before)];
    const behind = isBlank(after) ? [] : [paragraph.create(null, after)];
    at = $from.before(1) + (ahead[0]?.nodeSize ?? 0);
    tr.replaceWith($from.before(1), $from.after(1), [...ahead, block, ...behind]);
  } else {
    at = endOfTop(selection);
    tr.insert(at, block);
  }
  if (block.inlineContent) return tr.setSelection(TextSelection.create(tr.doc, at + 1, at + block.nodeSize - 1));
  const behind = at + block.nodeSize;
  // There is always a line to go on writing in.
  if (behind >= tr.doc.content.size) tr.insert(behind, paragraph.create());
  return tr.setSelection(Selection.near(tr.doc.resolve(behind), 1));
}

/** Puts a component in where the caret stands; null where the piece has no place in this field. */
export function insertPiece(state: EditorState, piece: Piece, where: Where): Transaction | null {
  const read = readWords(piece.text, where);
  const block = read.ok ? piecesOf(read.nodes, state.schema).firstChild : null;
  if (!block) return null;
  if (piece.stands === 'block') return onItsOwn(state, block);
  const chip = block.firstChild;
  return chip && intoSentence(state, chip);
}

/** Puts another value in the place of the chip at `at`, which keeps its emphasis. */
export function replaceChip(state: EditorState, at: number, piece: Piece, where: Where): Transaction | null {
  const old = state.doc.nodeAt(at);
  const read = readWords(piece.text, where);
  const block = read.ok ? piecesOf(read.nodes, state.schema).firstChild : null;
  const chip = old?.isInline ? block?.firstChild : block;
  if (!old || !chip) return null;
  const tr = state.tr.replaceWith(at, at + old.nodeSize, old.isInline ? chip.mark(old.marks) : chip);
  return tr.setSelection(NodeSelection.create(tr.doc, at));
}
