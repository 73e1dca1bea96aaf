import { lift, toggleMark, wrapIn } from 'prosemirror-commands';
import type { Schema } from 'prosemirror-model';
import { liftListItem, wrapInList } from 'prosemirror-schema-list';
import { TextSelection, type Command, type EditorState } from 'prosemirror-state';
import {
  addColumnAfter,
  addRowAfter,
  deleteColumn,
  deleteRow,
  deleteTable,
  findTable,
  isInTable,
} from 'prosemirror-tables';
import { markOf, typeOf } from '@/domain/writing/field/schema';

/** What a list, a table and a way of setting words are called in the menu, with their keys. */
export interface Format {
  name: string;
  keys?: string;
  run: Command;
}

const inside = ({ selection: { $from } }: EditorState, name: string): number => {
  for (let depth = $from.depth; depth > 0; depth -= 1) if ($from.node(depth).type.name === name) return depth;
  return 0;
};

/** Makes a list, turns one into the other kind, or takes the point out of it. */
export const toggleList =
  (name: 'bullet_list' | 'ordered_list'): Command =>
  (state, dispatch) => {
    const other = name === 'bullet_list' ? 'ordered_list' : 'bullet_list';
    const [mine, theirs] = [inside(state, name), inside(state, other)];
    if (mine > theirs) return liftListItem(typeOf(state.schema, 'list_item'))(state, dispatch);
    if (theirs > mine) {
      const { $from } = state.selection;
      const spread = $from.node(theirs).attrs['spread'] as boolean;
      dispatch?.(state.tr.setNodeMarkup($from.before(theirs), typeOf(state.schema, name), { spread }));
      return true;
    }
    return wrapInList(typeOf(state.schema, name))(state, dispatch);
  };

const newTable =
  (schema: Schema): Command =>
  (state, dispatch) => {
    const { $to } = state.selection;
    if (isInTable(state) || $to.depth < 1 || $to.node(1).type.name === 'Hold') return false;
    const row = (name: string) =>
      typeOf(schema, 'table_row').create(null, [typeOf(schema, name).create(), typeOf(schema, name).create()]);
    const table = typeOf(schema, 'table').create(null, [row('table_header'), row('table_cell'), row('table_cell')]);
    const top = $to.node(1);
    const empty = top.type.name === 'paragraph' && top.content.size === 0;
    const at = empty ? $to.before(1) : $to.after(1);
    const tr = empty ? state.tr.replaceWith(at, $to.after(1), table) : state.tr.insert(at, table);
    dispatch?.(tr.setSelection(TextSelection.create(tr.doc, at + 3)).scrollIntoView());
    return true;
  };

const MOST_COLUMNS = 20;
const anotherColumn: Command = (state, dispatch) => {
  const columns = findTable(state.selection.$from)?.node.firstChild?.childCount ?? 0;
  return columns < MOST_COLUMNS && addColumnAfter(state, dispatch);
};

const quote: Command = (state, dispatch) =>
  inside(state, 'blockquote') ? lift(state, dispatch) : wrapIn(typeOf(state.schema, 'blockquote'))(state, dispatch);

/** What can be done where the caret stands. */
export function formatsOf(schema: Schema, state: EditorState, openLink: Command, mod: string): Format[] {
  const all: Format[] = [
    { name: 'List', keys: '“- ”', run: toggleList('bullet_list') },
    { name: 'Numbered list', keys: '“1. ”', run: toggleList('ordered_list') },
    { name: 'Strong', keys: `${mod}B`, run: toggleMark(markOf(schema, 'strong')) },
    { name: 'Emphasis', keys: `${mod}I`, run: toggleMark(markOf(schema, 'emphasis')) },
    { name: 'As it is typed', keys: `${mod}E`, run: toggleMark(markOf(schema, 'code')) },
    { name: 'Link', keys: `${mod}K`, run: openLink },
    { name: 'Quotation', run: quote },
    ...(isInTable(state)
      ? [
          { name: 'Another row', run: addRowAfter },
          { name: 'Another column', run: anotherColumn },
          { name: 'Delete the row', run: deleteRow },
          { name: 'Delete the column', run: deleteColumn },
          { name: 'Delete the table', run: deleteTable },
        ]
      : [{ name: 'Table', run: newTable(schema) }]),
  ];
  return all.filter(({ run }) => run(state));
}
