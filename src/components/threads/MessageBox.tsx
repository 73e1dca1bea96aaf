import { useId, useRef, useState, type KeyboardEvent } from 'react';
import { TextArea } from '@/components/ui/TextArea';
import type { PersonRef } from '@/domain/api/schemas/common';
import { completions, nameBeingTyped } from '@/domain/review/mentions';

interface Props {
  label: string;
  hint?: string;
  error?: string | undefined;
  value: string;
  people: readonly PersonRef[];
  onChange: (text: string) => void;
}

/** A box for a message. After "@" it offers names: arrows choose, Enter or Tab takes one, Escape closes the list. */
export function MessageBox({ label, hint, error, value, people, onChange }: Props) {
  const id = useId();
  const area = useRef<HTMLTextAreaElement>(null);
  const [typed, setTyped] = useState<string | null>(null);
  const [at, setAt] = useState(0);
  const offered = typed === null ? [] : completions(typed, people);
  const chosen = offered[Math.min(at, offered.length - 1)];

  const look = (element: HTMLTextAreaElement) => {
    setTyped(nameBeingTyped(element.value, element.selectionStart));
    setAt(0);
  };
  const take = (name: string) => {
    const element = area.current;
    if (!element || typed === null) return;
    const caret = element.selectionStart;
    const start = caret - typed.length;
    onChange(`${value.slice(0, start)}${name} ${value.slice(caret).replace(/^ /, '')}`);
    setTyped(null);
    const after = start + name.length + 1;
    requestAnimationFrame(() => {
      element.focus();
      element.setSelectionRange(after, after);
    });
  };
  const onKey = (event: KeyboardEvent) => {
    if (!chosen) return;
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step) setAt((now) => (now + step + offered.length) % offered.length);
    else if (event.key === 'Enter' || event.key === 'Tab') take(chosen.name);
    else if (event.key === 'Escape') setTyped(null);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div className="message-box">
      <TextArea
        ref={area}
        name="text"
        id={`${id}-text`}
        label={label}
        {...(hint ? { hint } : {})}
        {...(error ? { error } : {})}
        rows={3}
        maxLength={4000}
        value={value}
        aria-autocomplete="list"
        aria-controls={chosen ? `${id}-names` : undefined}
        aria-activedescendant={chosen ? `${id}-${chosen.id}` : undefined}
        onChange={(event) => {
          onChange(event.target.value);
          look(event.target);
        }}
        onKeyDown={onKey}
        onBlur={() => setTyped(null)}
        onClick={(event) => look(event.currentTarget)}
      />
      <p role="status" className="sr-only">
        {chosen ? `${offered.length === 1 ? '1 name' : `${offered.length} names`}; ${chosen.name}` : ''}
      </p>
      {chosen && (
        <div id={`${id}-names`} role="listbox" tabIndex={-1} aria-label="People" className="name-list">
          {offered.map((person) => (
            <div
              key={person.id}
              id={`${id}-${person.id}`}
              role="option"
              tabIndex={-1}
              aria-selected={person === chosen}
              // Before the box loses the focus.
              onPointerDown={(event) => {
                event.preventDefault();
                take(person.name);
              }}
            >
              <b>{person.name}</b>
              {person.shop && `, ${person.shop}`}
            </div>
          ))}
        </div>
      )}
    </div>
  );
}
