import { useId, useMemo, useRef, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { classes } from '@/components/ui/classes';
import { problemSpan } from '@/domain/writing/source/problemSpan';
import type { SourceProblem } from '@/domain/procedure/types';
import { useDesk } from './desk';
import { useEditor } from './source/useEditor';
import type { Checked } from './useCheck';

const PLAIN = 'matchmark:plain-source';
const readPlain = () => {
  try {
    return localStorage.getItem(PLAIN) === '1';
  } catch {
    return false;
  }
};

/** Whether this person wants the browser's own box, held on this device. */
function usePlain(): [boolean, (plain: boolean) => void] {
  const [plain, setPlain] = useState(readPlain);
  const choose = (next: boolean) => {
    setPlain(next);
    try {
      localStorage.setItem(PLAIN, next ? '1' : '0');
    } catch {
      // A device that keeps nothing still lets it be chosen for now.
    }
  };
  return [plain, choose];
}

function Problems({ problems, goTo }: { problems: readonly SourceProblem[]; goTo: (problem: SourceProblem) => void }) {
  if (problems.length === 0) return null;
  return (
    <section className="heavy-edge px-4 py-3">
      <h2 className="text-[1rem]">{problems.length} to mend</h2>
      <ul className="mt-1.5 flex flex-col gap-1.5">
        {problems.map((p) => (
          <li key={`${p.line} ${p.column} ${p.message}`}>
            <button
              type="button"
              className="mr-2 font-semibold text-petrol underline underline-offset-[3px]"
              onClick={() => goTo(p)}
            >
              Line {p.line}
            </button>
            {p.message}
          </li>
        ))}
      </ul>
    </section>
  );
}

/**
 * The whole text as it is stored, with what is wrong by line. For texts that the form cannot show, and for who prefers it.
 * The plain box works at once and everywhere; the editor takes its place when it has been loaded.
 */
export function TextMode({
  text,
  onText,
  checked,
}: {
  text: string;
  onText: (text: string) => void;
  checked: Checked;
}) {
  const { engines, drawings } = useDesk();
  const id = useId();
  const area = useRef<HTMLTextAreaElement>(null);
  const [plain, setPlain] = usePlain();
  const known = useMemo(() => ({ engines, drawings }), [engines, drawings]);
  const { problems } = checked;
  const [label, hint] = [`${id}label`, `${id}hint`];
  const {
    parent,
    stands,
    line,
    goTo: goToInEditor,
  } = useEditor({
    text,
    onText,
    problems,
    settled: !checked.checking,
    known,
    plain,
    area,
    labelledBy: label,
    describedBy: hint,
  });
  const on = stands === 'editor';
  const here = on ? problems.filter((p) => p.line === line) : [];
  const goTo = (problem: SourceProblem) => {
    if (on) return goToInEditor(problem);
    const { from, to } = problemSpan(text, problem);
    area.current?.focus();
    area.current?.setSelectionRange(from, to);
  };
  return (
    <div className="flex flex-col gap-4">
      <div className="flex flex-col gap-1.5">
        <div className="flex flex-wrap items-center justify-between gap-x-5">
          <label id={label} htmlFor={`${id}source`} className="font-medium">
            The whole text
          </label>
          <Button kind="quiet" className="-mr-2 text-small" onClick={() => setPlain(!plain)}>
            {plain ? 'Use the editor with line numbers' : 'Use a plain box'}
          </Button>
        </div>
        <p id={hint} className="-mt-2 text-small text-ink-2">
          Front matter between lines of three hyphens, then the steps.
          {on &&
            ' Ctrl and Space offer what can stand at the caret. Tab leaves the text; F8 goes to the next thing to mend.'}
          {stands === 'failed' && ' The editor could not be loaded; this box does the same work.'}
        </p>
        <div ref={parent} hidden={!on} className="source-editor" />
        {!on && (
          <textarea
            ref={area}
            id={`${id}source`}
            name="source"
            aria-describedby={hint}
            value={text}
            rows={28}
            spellCheck={false}
            className={classes('field-box resize-y whitespace-pre !font-sans !text-base leading-normal')}
            onChange={(event) => onText(event.target.value)}
          />
        )}
        {on && (
          <div role="status" className="source-here">
            {here.length === 0 ? (
              <span className="text-ink-2" aria-hidden="true">
                Line {line}
              </span>
            ) : (
              here.map((p) => (
                <p key={`${p.column} ${p.message}`} className="font-medium">
                  Line {p.line}: {p.message}
                </p>
              ))
            )}
          </div>
        )}
      </div>
      <Problems problems={problems} goTo={goTo} />
    </div>
  );
}
