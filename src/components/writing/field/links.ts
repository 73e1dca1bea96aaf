import type { EditorState, Transaction } from 'prosemirror-state';
import { markOf } from '@/domain/writing/field/schema';

/** The stretch that a link is about: what is selected, else the link that the caret stands in. */
function stretch(state: EditorState): { from: number; to: number } {
  const { $from, from, to, empty } = state.selection;
  if (!empty) return { from, to };
  const link = markOf(state.schema, 'link');
  const mark = link.isInSet($from.marks()) ?? link.isInSet($from.nodeAfter?.marks ?? []);
  if (!mark) return { from, to };
  let start = from;
  let end = to;
  $from.parent.forEach((node, offset) => {
    const at = $from.start() + offset;
    if (!mark.isInSet(node.marks)) return;
    if (at + node.nodeSize < from || at > to) return;
    start = Math.min(start, at);
    end = Math.max(end, at + node.nodeSize);
  });
  return { from: start, to: end };
}

/** Where the link at the selection leads; empty where there is none. */
export function hrefAt(state: EditorState): string {
  const { from, to } = stretch(state);
  let href = '';
  state.doc.nodesBetween(from, to, (node) => {
    const mark = markOf(state.schema, 'link').isInSet(node.marks);
    if (mark && !href) href = mark.attrs['href'] as string;
  });
  return href;
}

/** Sets or takes away the link there. Without any words the address itself is put in. */
export function linked(state: EditorState, href: string | null): Transaction {
  const link = markOf(state.schema, 'link');
  const { from, to } = stretch(state);
  if (href === null) return state.tr.removeMark(from, to, link);
  if (from < to) return state.tr.addMark(from, to, link.create({ href }));
  const marks = link.create({ href }).addToSet(state.selection.$from.marks());
  return state.tr.replaceWith(from, to, state.schema.text(href, marks));
}
