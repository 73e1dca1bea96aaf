import { Fragment, Slice, type Node } from 'prosemirror-model';
import type { EditorState, Transaction } from 'prosemirror-state';
import { typeOf } from './schema';

/** Everything inside as words in one line, a blank where a paragraph ended. */
function inOneLine(content: Fragment): Node[] {
  const out: Node[] = [];
  const walk = (node: Node) => {
    if (node.isInline) out.push(node.type.name === 'hard_break' ? node.type.schema.text(' ') : node);
    else {
      if (node.inlineContent && out.length) out.push(node.type.schema.text(' '));
      node.forEach(walk);
    }
  };
  content.forEach(walk);
  return out;
}

/** Whether whole passages have no place where the caret stands: in a cell and in a hold point. */
export const takesWordsOnly = ({ selection: { $from } }: EditorState): boolean =>
  $from.parent.inlineContent && $from.parent.type.name !== 'paragraph';

/** Puts pasted passages in the place of the selection: the first and the last run into the words around them. */
export function insertPasted(state: EditorState, content: Fragment): Transaction {
  const { tr, schema } = state;
  if (content.childCount === 0) return tr;
  if (takesWordsOnly(state))
    return tr.replaceSelection(new Slice(Fragment.from(inOneLine(content)), 0, 0)).scrollIntoView();
  const open = (node: Node | null) => (node?.type === typeOf(schema, 'paragraph') ? 1 : 0);
  return tr.replaceSelection(new Slice(content, open(content.firstChild), open(content.lastChild))).scrollIntoView();
}
