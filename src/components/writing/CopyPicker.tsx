import { useEffect, useRef, useState } from 'react';
import { ask } from '@/components/api/ask';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { Choice } from './Way';

export interface SheetToCopy {
  number: string;
  title: string;
  letter: string;
  /** Name of its book. */
  book: string;
  withdrawn: boolean;
}

const PAUSE = 150;
const MOST = 8;

/**
 * Finds the sheet that is copied. With a script the list follows what is typed; without one a button asks the server.
 * What was chosen stays in the list, whatever is typed next.
 */
export function CopyPicker({
  q,
  hits: came,
  chosen: first,
  error,
}: {
  q: string;
  hits: readonly SheetToCopy[];
  chosen: string;
  error: boolean;
}) {
  const [asked, setAsked] = useState(q);
  const [hits, setHits] = useState(came);
  const [chosen, setChosen] = useState(() => came.find(({ number }) => number === first) ?? null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const typed = useRef(false);
  useEffect(() => {
    if (!typed.current) return;
    const words = asked.trim();
    const call = new AbortController();
    const timer = setTimeout(() => {
      const found = words
        ? ask<{ items: SheetToCopy[] }>('GET', `/search?q=${encodeURIComponent(words)}&limit=${MOST}`, call)
        : Promise.resolve({ items: [] });
      found.then(
        ({ items }) => {
          setHits(items);
          setTrouble(null);
        },
        (thrown: unknown) => {
          if (!call.signal.aborted)
            setTrouble(thrown instanceof Error && thrown.name === 'Refused' ? thrown.message : 'There is no network.');
        },
      );
    }, PAUSE);
    return () => {
      clearTimeout(timer);
      call.abort();
    };
  }, [asked]);

  const usable = hits.filter(({ withdrawn }) => !withdrawn);
  const shown = chosen && !usable.some(({ number }) => number === chosen.number) ? [chosen, ...usable] : usable;
  return (
    <div>
      <div className="flex flex-wrap items-end gap-3">
        <Field
          label="Which sheet?"
          hint="Its number, its task, a part or an engine."
          name="q"
          defaultValue={q}
          maxLength={200}
          autoComplete="off"
          spellCheck={false}
          fieldClass="min-w-0 flex-1 basis-64"
          onInput={({ currentTarget }) => {
            typed.current = true;
            setAsked(currentTarget.value);
          }}
          onKeyDown={(event) => {
            // Enter looks up here, and does not start the draft.
            if (event.key === 'Enter') event.preventDefault();
          }}
        />
        <span data-without-script="">
          <Button type="submit" name="act" value="look-up">
            Look up
          </Button>
        </span>
      </div>
      {trouble && (
        <p role="alert" className="mt-2 font-medium">
          {trouble}
        </p>
      )}
      <fieldset className="mt-3" aria-describedby={error ? 'sheet-error' : undefined}>
        <legend className="sr-only">The sheet to copy</legend>
        {shown.map((hit) => (
          <div key={hit.number} className="border-t border-hair">
            <Choice
              name="sheet"
              value={hit.number}
              chosen={hit.number === first}
              label={<span className="font-serif font-bold">{hit.title}</span>}
              hint={`${hit.number}, revision ${hit.letter}, ${hit.book}`}
              onChoose={() => setChosen(hit)}
            />
          </div>
        ))}
      </fieldset>
      <p role="status" className="text-ink-2 empty:hidden">
        {asked.trim() && shown.length === 0 ? 'No sheet in use has these words.' : ''}
      </p>
    </div>
  );
}
