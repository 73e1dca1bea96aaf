import { useRef } from 'react';
import { TextArea } from '@/components/ui/TextArea';
import type { Checked } from './useCheck';

/** The whole text as it is stored, with what is wrong by line. For texts that the form cannot show, and for who prefers it. */
export function TextMode({
  text,
  onText,
  checked,
}: {
  text: string;
  onText: (text: string) => void;
  checked: Checked;
}) {
  const area = useRef<HTMLTextAreaElement>(null);
  const goToLine = (line: number) => {
    const lines = text.split('\n');
    const start = lines.slice(0, line - 1).join('\n').length + (line > 1 ? 1 : 0);
    area.current?.focus();
    area.current?.setSelectionRange(start, start + (lines[line - 1]?.length ?? 0));
  };
  return (
    <div className="flex flex-col gap-4">
      <TextArea
        label="The whole text"
        hint="Front matter between lines of three hyphens, then the steps."
        name="source"
        ref={area}
        value={text}
        rows={28}
        spellCheck={false}
        className="whitespace-pre !font-sans !text-base leading-normal"
        onChange={(event) => onText(event.target.value)}
      />
      {checked.problems.length > 0 && (
        <section className="heavy-edge px-4 py-3">
          <h2 className="text-[1rem]">{checked.problems.length} to mend</h2>
          <ul className="mt-1.5 flex flex-col gap-1.5">
            {checked.problems.map((p) => (
              <li key={`${p.line} ${p.column} ${p.message}`}>
                <button
                  type="button"
                  className="mr-2 font-semibold text-petrol underline underline-offset-[3px]"
                  onClick={() => goToLine(p.line)}
                >
                  Line {p.line}
                </button>
                {p.message}
              </li>
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}
