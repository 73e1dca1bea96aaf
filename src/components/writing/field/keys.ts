import {
  baseKeymap,
  chainCommands,
  createParagraphNear,
  exitCode,
  liftEmptyBlock,
  newlineInCode,
  splitBlockKeepMarks,
  toggleMark,
} from 'prosemirror-commands';
import { redo, undo } from 'prosemirror-history';
import { undoInputRule } from 'prosemirror-inputrules';
import type { Schema } from 'prosemirror-model';
import { liftListItem, sinkListItem, splitListItemKeepMarks } from 'prosemirror-schema-list';
import { TextSelection, type Command } from 'prosemirror-state';
import { addRowAfter, goToNextCell, isInTable } from 'prosemirror-tables';
import { markOf, typeOf } from '@/domain/writing/field/schema';
import { toggleList } from './formats';

/** Lists stand at most this deep; the text of a sheet holds no more. */
const DEEPEST_LIST = 6;

const inHold: Command = ({ selection: { $from } }) => $from.parent.type.name === 'Hold';

/** Out of a hold point into a paragraph behind it: its words are one sentence or two. */
const leaveHold: Command = (state, dispatch) => {
  if (!inHold(state)) return false;
  const behind = state.selection.$from.after();
  const tr = state.tr.insert(behind, typeOf(state.schema, 'paragraph').create());
  dispatch?.(tr.setSelection(TextSelection.create(tr.doc, behind + 1)).scrollIntoView());
  return true;
};

/** An empty hold point goes; one with words stays where it is. */
const takeHoldAway: Command = (state, dispatch) => {
  const { $from, empty } = state.selection;
  if (!inHold(state) || !empty || $from.parentOffset > 0) return false;
  if ($from.parent.content.size > 0) return true;
  const tr = state.tr.setNodeMarkup($from.before(), typeOf(state.schema, 'paragraph'));
  dispatch?.(tr);
  return true;
};

const nextRow: Command = (state, dispatch, view) => {
  if (!isInTable(state)) return false;
  if (goToNextCell(1)(state, dispatch)) return true;
  addRowAfter(state, dispatch);
  if (view) goToNextCell(1)(view.state, dispatch);
  return true;
};

const lineBreak =
  (schema: Schema): Command =>
  (state, dispatch) => {
    const type = typeOf(schema, 'hard_break');
    const { $from } = state.selection;
    if (!$from.parent.inlineContent || !$from.parent.type.contentMatch.matchType(type)) return isInTable(state);
    dispatch?.(state.tr.replaceSelectionWith(type.create()).scrollIntoView());
    return true;
  };

const atItemStart: Command = ({ selection: { $from, empty } }) =>
  empty &&
  $from.parentOffset === 0 &&
  $from.depth > 1 &&
  $from.node(-1).type.name === 'list_item' &&
  $from.index(-1) === 0;

const deepEnough: Command = ({ selection: { $from } }) => {
  let depth = 0;
  for (let d = $from.depth; d > 0; d -= 1) if ($from.node(d).type.name === 'list_item') depth += 1;
  return depth >= DEEPEST_LIST;
};

const both =
  (when: Command, then: Command): Command =>
  (state, dispatch, view) =>
    when(state) && then(state, dispatch, view);

/** What keys do outside of the words themselves. */
export interface KeyActs {
  openChip: Command;
  openLink: Command;
  /** Escape was pressed, so that Tab leaves the field. */
  leaving: () => boolean;
}

/** Keys of a field. Tab works in lists and tables; after Escape it leaves the field, as it does anywhere else. */
export function keysOf(schema: Schema, acts: KeyActs): Record<string, Command> {
  const item = typeOf(schema, 'list_item');
  const unlessLeaving =
    (command: Command): Command =>
    (state, dispatch, view) =>
      !acts.leaving() && command(state, dispatch, view);
  return {
    ...baseKeymap,
    Enter: chainCommands(
      acts.openChip,
      leaveHold,
      nextRow,
      splitListItemKeepMarks(item),
      newlineInCode,
      createParagraphNear,
      liftEmptyBlock,
      splitBlockKeepMarks,
    ),
    'Shift-Enter': chainCommands(exitCode, lineBreak(schema)),
    Backspace: chainCommands(
      undoInputRule,
      takeHoldAway,
      both(atItemStart, liftListItem(item)),
      baseKeymap['Backspace'] ?? (() => false),
    ),
    Tab: unlessLeaving(chainCommands(goToNextCell(1), deepEnough, sinkListItem(item))),
    'Shift-Tab': unlessLeaving(chainCommands(goToNextCell(-1), liftListItem(item))),
    'Mod-b': toggleMark(markOf(schema, 'strong')),
    'Mod-i': toggleMark(markOf(schema, 'emphasis')),
    'Mod-e': toggleMark(markOf(schema, 'code')),
    'Mod-k': acts.openLink,
    'Mod-Shift-7': toggleList('ordered_list'),
    'Mod-Shift-8': toggleList('bullet_list'),
    'Mod-z': undo,
    'Mod-y': redo,
    'Shift-Mod-z': redo,
  };
}
