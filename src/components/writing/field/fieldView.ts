import { closeHistory } from 'prosemirror-history';
import type { Node, Schema, Slice } from 'prosemirror-model';
import {
  EditorState,
  NodeSelection,
  Selection,
  TextSelection,
  type Command,
  type Plugin,
  type Transaction,
} from 'prosemirror-state';
import { EditorView } from 'prosemirror-view';
import type { SourceProblem } from '@/domain/procedure/types';
import type { Draft } from '@/domain/writing/draft';
import { documentOf } from '@/domain/writing/field/fromTree';
import { insertPiece, replaceChip } from '@/domain/writing/field/insertPiece';
import { readWords } from '@/domain/writing/field/readWords';
import { isChip, SCHEMAS, standsAlone, typeOf, type Where } from '@/domain/writing/field/schema';
import { writeWords } from '@/domain/writing/field/writeWords';
import type { Piece } from '@/domain/writing/insert';
import { Chips, wordsIn } from './chipViews';
import { bringIn, copiedText } from './clipboard';
import { formatsOf, type Format } from './formats';
import { lineBehind, pluginsOf } from './plugins';

/** What the field tells its surroundings. */
export interface Told {
  /** The words as they are stored, after each change. */
  text: (text: string) => void;
  /** The chip at this place is to be opened. */
  open: (at: number) => void;
  link: () => void;
  /** What a paste left out, in sentences. */
  leftOut: (sentences: string[]) => void;
  /** What the caret has come to stand on, in words; empty where on nothing of its own. */
  selected: (words: string) => void;
  blur: () => void;
  /** Words came from outside that the field cannot show. */
  unreadable: (problem: SourceProblem) => void;
}

/** One field of words on the screen: the view of a document that is read from a text and written back to it. */
export class FieldView {
  readonly view: EditorView;
  readonly schema: Schema;
  private readonly chips: Chips;
  private readonly plugins: Plugin[];
  private written: string;
  private waiting: (() => void)[] = [];
  private leaving = false;

  constructor(
    place: HTMLElement,
    private readonly where: Where,
    doc: Node,
    text: string,
    draft: Draft,
    private readonly told: Told,
  ) {
    this.schema = SCHEMAS[where];
    this.written = text;
    this.chips = new Chips(draft);
    this.plugins = pluginsOf(this.schema, {
      openChip: this.openChip,
      openLink: this.openLink,
      leaving: () => this.leaving,
    });
    this.view = new EditorView(place, {
      state: this.stateOf(doc),
      nodeViews: this.chips.nodeViews,
      clipboardSerializer: this.chips.serializer(this.schema),
      clipboardTextSerializer: (slice) => copiedText(slice, where),
      handlePaste: (view, event, slice) => {
        this.apart();
        return event.clipboardData !== null && bringIn(view, event.clipboardData, slice, where, told.leftOut);
      },
      handleDrop: (view, event, slice, moved) => this.dropped(view, event, slice, moved),
      handleClickOn: (view, _pos, node, at, _event, direct) => {
        if (!direct || !isChip(node)) return false;
        view.dispatch(view.state.tr.setSelection(NodeSelection.create(view.state.doc, at)));
        told.open(at);
        return true;
      },
      handleTextInput: (view, _from, _to, typed) => this.typedOnBlock(view, typed),
      handleDOMEvents: {
        blur: () => {
          this.leaving = false;
          told.blur();
          return false;
        },
        compositionend: () => {
          setTimeout(() => this.afterComposition());
          return false;
        },
        keydown: (_view, event) => {
          if (event.key === 'Escape') this.leaving = true;
          else if (event.key !== 'Tab' && event.key !== 'Shift') this.leaving = false;
          return false;
        },
      },
      dispatchTransaction: (tr) => this.apply(tr),
    });
  }

  private stateOf(doc: Node): EditorState {
    const state = EditorState.create({ doc, plugins: this.plugins });
    const tr = lineBehind(doc, state.tr);
    return tr ? state.apply(tr) : state;
  }

  private apply(tr: Transaction): void {
    const before = this.view.state.selection;
    this.view.updateState(this.view.state.apply(tr));
    const { doc, selection } = this.view.state;
    if (tr.docChanged) {
      const text = writeWords(doc, this.where);
      if (text !== this.written) {
        this.written = text;
        this.told.text(text);
      }
    }
    if (!selection.eq(before)) {
      const chip = selection instanceof NodeSelection && isChip(selection.node) ? selection.node : null;
      this.told.selected(chip ? wordsIn(this.chips.wordsOf(chip), chip) : '');
    }
  }

  readonly openChip: Command = ({ selection }, dispatch) => {
    if (!(selection instanceof NodeSelection) || !isChip(selection.node)) return false;
    if (dispatch) this.told.open(selection.from);
    return true;
  };

  readonly openLink: Command = ({ selection }, dispatch) => {
    if (!selection.$from.parent.inlineContent || selection instanceof NodeSelection) return false;
    if (dispatch) this.told.link();
    return true;
  };

  /** What is dragged in from elsewhere is cleaned as what is pasted; a file must not take the place of the page. */
  private dropped(view: EditorView, event: DragEvent, slice: Slice, moved: boolean): boolean {
    const at = view.posAtCoords({ left: event.clientX, top: event.clientY });
    if (moved || !event.dataTransfer || !at) return false;
    view.dispatch(closeHistory(view.state.tr).setSelection(Selection.near(view.state.doc.resolve(at.pos))));
    const taken = bringIn(view, event.dataTransfer, slice, this.where, this.told.leftOut);
    if (taken) event.preventDefault();
    return taken;
  }

  /** Letters typed while a drawing or a hold point is selected go below it: it is taken away on purpose only. */
  private typedOnBlock(view: EditorView, typed: string): boolean {
    const { selection } = view.state;
    if (!(selection instanceof NodeSelection) || !standsAlone(selection.node)) return false;
    this.writeBeside(selection.from, 'below', typed);
    return true;
  }

  /** A new line above or below the drawing, worksheet or hold point at `at`, with the caret in it. */
  writeBeside(at: number, side: 'above' | 'below', typed = ''): void {
    const { state } = this.view;
    const node = state.doc.nodeAt(at);
    const to = side === 'above' ? at : at + (node?.nodeSize ?? 0);
    const text = typed ? this.schema.text(typed) : undefined;
    const tr = state.tr.insert(to, typeOf(this.schema, 'paragraph').create(null, text));
    this.view.dispatch(tr.setSelection(TextSelection.create(tr.doc, to + 1 + typed.length)).scrollIntoView());
    this.view.focus();
  }

  /** What is done next is undone by itself, however soon it follows on typing. */
  private apart(): void {
    this.view.dispatch(closeHistory(this.view.state.tr));
  }

  /** Acts now, or once what is being composed (accents, other scripts, a phone's suggestions) has been put in. */
  private whenSettled(act: () => void): void {
    if (this.view.composing) this.waiting.push(act);
    else act();
  }

  private afterComposition(): void {
    if (this.view.isDestroyed || this.view.composing) return;
    const acts = this.waiting;
    this.waiting = [];
    for (const act of acts) act();
  }

  /** Takes words over that were set from outside; those that the field wrote itself are none. */
  take(text: string): void {
    if (text === this.written) return;
    const read = readWords(text, this.where);
    if (!read.ok) {
      this.told.unreadable(read.problem);
      return;
    }
    this.whenSettled(() => this.replace(documentOf(read.nodes, this.schema), text));
  }

  private replace(doc: Node, text: string): void {
    this.written = text;
    const old = this.view.state;
    const next = this.stateOf(doc);
    const start = old.doc.content.findDiffStart(next.doc.content);
    if (start === null) return;
    const end = old.doc.content.findDiffEnd(next.doc.content);
    const moved = (at: number) => (at <= start || !end ? at : at >= end.a ? at + end.b - end.a : start);
    const at = (n: number) => next.doc.resolve(Math.max(0, Math.min(moved(n), next.doc.content.size)));
    const selection = TextSelection.between(at(old.selection.anchor), at(old.selection.head));
    this.view.updateState(next.apply(next.tr.setSelection(selection)));
  }

  follow = (draft: Draft) => this.whenSettled(() => this.chips.follow(draft));

  put(piece: Piece): void {
    this.apart();
    const tr = insertPiece(this.view.state, piece, this.where);
    this.view.focus();
    if (tr) this.view.dispatch(tr.scrollIntoView());
  }

  /** Another value in the place of the chip at `at`. */
  exchange(at: number, piece: Piece): void {
    this.apart();
    const tr = replaceChip(this.view.state, at, piece, this.where);
    this.view.focus();
    if (tr) this.view.dispatch(tr);
  }

  remove(at: number): void {
    this.apart();
    const node = this.view.state.doc.nodeAt(at);
    this.view.focus();
    if (node) this.view.dispatch(this.view.state.tr.delete(at, at + node.nodeSize));
  }

  formats(mod: string): Format[] {
    return formatsOf(this.schema, this.view.state, this.openLink, mod);
  }

  run(command: Command): void {
    this.apart();
    this.view.focus();
    command(this.view.state, this.view.dispatch, this.view);
  }

  wordsOf = (node: Node) => this.chips.wordsOf(node);
  destroy = () => this.view.destroy();
}
