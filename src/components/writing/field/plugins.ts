import { history } from 'prosemirror-history';
import { inputRules, wrappingInputRule } from 'prosemirror-inputrules';
import { keymap } from 'prosemirror-keymap';
import type { Node, Schema } from 'prosemirror-model';
import { Plugin, type Transaction } from 'prosemirror-state';
import { tableEditing } from 'prosemirror-tables';
import { typeOf } from '@/domain/writing/field/schema';
import { keysOf, type KeyActs } from './keys';

/** Nothing can be typed behind a table or a drawing that ends the words, so there is always a line. */
export const lineBehind = (doc: Node, tr: Transaction): Transaction | null => {
  const last = doc.lastChild;
  if (!last || last.type.name === 'paragraph' || last.type.name.endsWith('_list')) return null;
  return tr.insert(doc.content.size, typeOf(doc.type.schema, 'paragraph').create()).setMeta('addToHistory', false);
};

/** Keys, lists that begin with a typed sign, undoing, and tables that keep their shape. */
export const pluginsOf = (schema: Schema, acts: KeyActs): Plugin[] => [
  inputRules({
    rules: [
      wrappingInputRule(/^\s*[-*•]\s$/, typeOf(schema, 'bullet_list')),
      wrappingInputRule(
        /^(\d{1,4})[.)]\s$/,
        typeOf(schema, 'ordered_list'),
        (found) => ({ order: Number(found[1]) }),
        (found, node) => node.childCount + (node.attrs['order'] as number) === Number(found[1]),
      ),
    ],
  }),
  keymap(keysOf(schema, acts)),
  history(),
  tableEditing(),
  new Plugin({
    appendTransaction: (trs, _old, state) => (trs.some((tr) => tr.docChanged) ? lineBehind(state.doc, state.tr) : null),
  }),
];
