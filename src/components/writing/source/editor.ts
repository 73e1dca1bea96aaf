import { completionKeymap } from '@codemirror/autocomplete';
import { defaultKeymap, history, historyKeymap } from '@codemirror/commands';
import { markdownLanguage } from '@codemirror/lang-markdown';
import { yamlFrontmatter } from '@codemirror/lang-yaml';
import { lintKeymap, setDiagnostics } from '@codemirror/lint';
import { EditorSelection, EditorState, Transaction } from '@codemirror/state';
import {
  drawSelection,
  EditorView,
  highlightActiveLine,
  highlightActiveLineGutter,
  keymap,
  lineNumbers,
} from '@codemirror/view';
import type { SourceProblem } from '@/domain/procedure/types';
import type { Known } from '@/domain/writing/source/offer';
import { problemSpan } from '@/domain/writing/source/problemSpan';
import { completion } from './complete';
import { look } from './look';

export interface SourceEditor {
  /** Takes over a text that was set elsewhere; what the author typed is left alone where it is the same. */
  setText: (text: string) => void;
  /** Underlines what is wrong. They must be those of the text as it stands. */
  setProblems: (problems: readonly SourceProblem[]) => void;
  /** Puts the caret there, both counted from 1. */
  goTo: (line: number, column: number) => void;
  destroy: () => void;
}

interface Options {
  parent: HTMLElement;
  text: string;
  /** Where the caret stood in the field that this takes the place of, and whether it was there. */
  selection: { from: number; to: number };
  focus: boolean;
  known: () => Known;
  labelledBy: string;
  describedBy: string;
  onText: (text: string) => void;
  /** The line of the caret, from 1. */
  onLine: (line: number) => void;
}

/** The part of the text that differs, so that the caret and the undo of the rest stay. */
function difference(from: string, to: string): { from: number; to: number; insert: string } {
  const shorter = Math.min(from.length, to.length);
  let start = 0;
  while (start < shorter && from[start] === to[start]) start += 1;
  let end = 0;
  while (end < shorter - start && from[from.length - 1 - end] === to[to.length - 1 - end]) end += 1;
  return { from: start, to: from.length - end, insert: to.slice(start, to.length - end) };
}

/**
 * A sheet's text with line numbers, highlighting, completion and what is wrong underlined. Tab leaves it, as it leaves any
 * field, so that nobody who works by keyboard is caught in it (WCAG 2.2, 2.1.2).
 */
export function sourceEditor(options: Options): SourceEditor {
  const { parent, text, selection, known, labelledBy, describedBy, onText, onLine } = options;
  const view = new EditorView({
    parent,
    state: EditorState.create({
      doc: text,
      selection: EditorSelection.single(Math.min(selection.from, text.length), Math.min(selection.to, text.length)),
      extensions: [
        lineNumbers(),
        highlightActiveLine(),
        highlightActiveLineGutter(),
        history(),
        drawSelection(),
        EditorView.lineWrapping,
        yamlFrontmatter({ content: markdownLanguage }),
        look,
        completion(known),
        keymap.of([...completionKeymap, ...lintKeymap, ...historyKeymap, ...defaultKeymap]),
        EditorView.contentAttributes.of({
          'aria-labelledby': labelledBy,
          'aria-describedby': describedBy,
          tabindex: '0',
          spellcheck: 'false',
          autocapitalize: 'off',
        }),
        EditorView.updateListener.of((update) => {
          const outside = update.transactions.some((one) => one.annotation(Transaction.userEvent) === 'set');
          if (update.docChanged && !outside) onText(update.state.doc.toString());
          if (update.docChanged || update.selectionSet)
            onLine(update.state.doc.lineAt(update.state.selection.main.head).number);
        }),
      ],
    }),
  });
  onLine(view.state.doc.lineAt(view.state.selection.main.head).number);
  if (options.focus) view.focus();
  return {
    setText(next) {
      const now = view.state.doc.toString();
      if (next !== now) view.dispatch({ changes: difference(now, next), userEvent: 'set' });
    },
    setProblems(problems) {
      const now = view.state.doc.toString();
      view.dispatch(
        setDiagnostics(
          view.state,
          problems.map((problem) => ({
            ...problemSpan(now, problem),
            severity: 'error' as const,
            message: problem.message,
          })),
        ),
      );
    },
    goTo(line, column) {
      const { from } = problemSpan(view.state.doc.toString(), { line, column });
      view.focus();
      view.dispatch({ selection: { anchor: from }, effects: EditorView.scrollIntoView(from, { y: 'center' }) });
    },
    destroy: () => view.destroy(),
  };
}
