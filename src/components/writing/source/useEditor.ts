import { useCallback, useEffect, useRef, useState, type RefObject } from 'react';
import type { SourceProblem } from '@/domain/procedure/types';
import type { Known } from '@/domain/writing/source/offer';
import type { SourceEditor } from './editor';

/** `area`: the plain box, chosen or while the editor is on its way. `failed`: it could not be loaded. */
export type Stands = 'area' | 'editor' | 'failed';

interface Given {
  text: string;
  onText: (text: string) => void;
  problems: readonly SourceProblem[];
  /** The problems are those of the text as it stands. */
  settled: boolean;
  known: Known;
  /** The plain box is wanted, so nothing is loaded. */
  plain: boolean;
  area: RefObject<HTMLTextAreaElement | null>;
  labelledBy: string;
  describedBy: string;
}

/** Loads the editor when the sheet is first edited as text, and puts it in the place of the plain box. */
export function useEditor({ text, onText, problems, settled, known, plain, area, labelledBy, describedBy }: Given) {
  const parent = useRef<HTMLDivElement>(null);
  const [editor, setEditor] = useState<SourceEditor | null>(null);
  const [failed, setFailed] = useState(false);
  const [line, setLine] = useState(1);
  const now = useRef({ text, onText, known });
  useEffect(() => {
    now.current = { text, onText, known };
  });

  useEffect(() => {
    if (plain) return;
    let made: SourceEditor | null = null;
    let over = false;
    import('./editor')
      .then(({ sourceEditor }) => {
        if (over || !parent.current) return;
        const box = area.current;
        made = sourceEditor({
          parent: parent.current,
          text: now.current.text,
          selection: { from: box?.selectionStart ?? 0, to: box?.selectionEnd ?? 0 },
          focus: box !== null && document.activeElement === box,
          known: () => now.current.known,
          labelledBy,
          describedBy,
          onText: (next) => now.current.onText(next),
          onLine: setLine,
        });
        setEditor(made);
      })
      .catch(() => !over && setFailed(true));
    return () => {
      over = true;
      made?.destroy();
      setEditor(null);
    };
  }, [plain, area, labelledBy, describedBy]);

  useEffect(() => editor?.setText(text), [editor, text]);
  useEffect(() => {
    if (settled) editor?.setProblems(problems);
  }, [editor, problems, settled]);

  const goTo = useCallback((at: Pick<SourceProblem, 'line' | 'column'>) => editor?.goTo(at.line, at.column), [editor]);
  const stands: Stands = plain ? 'area' : editor ? 'editor' : failed ? 'failed' : 'area';
  return { parent, stands, line, goTo };
}
