import { useEffect, useRef } from 'react';
import { PhotoPicker } from '@/components/photos/PhotoPicker';
import type { PhotoPicks } from '@/components/photos/usePhotoPicks';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';
import { Select } from '@/components/ui/Select';
import { TextArea } from '@/components/ui/TextArea';
import type { PersonRef } from '@/domain/api/schemas/common';
import { MessageBox } from './MessageBox';
import type { StartWritten } from './startWritten';
import type { ThreadTrouble } from './useThreads';
import { START_WORDS } from './words';

interface Props {
  written: StartWritten;
  /** What it is about, in words. */
  place: string;
  /** What stands there now, for a value. */
  now: string | null;
  /** Fields to choose from, where the place is an entry as a whole. */
  fields: readonly { value: string; label: string }[];
  people: readonly PersonRef[];
  picks: PhotoPicks;
  trouble: ThreadTrouble | null;
  pending: boolean;
  version: number;
  href: string;
  onWrite: (written: StartWritten) => void;
  onSend: () => void;
  onCancel: () => void;
}

const TITLES = { question: 'Ask about', remark: 'Remark on', suggestion: 'Suggest for' } as const;
const TEXTS = {
  question: { label: 'Your question', hint: 'It must be answered and resolved before this can be published.' },
  remark: { label: 'Your remark', hint: '' },
  suggestion: { label: 'Why', hint: 'May be left out. The author accepts it with one press.' },
} as const;

/** Asks for what a thread begins with, in place, so that the text stays in sight. */
export function StartPanel({
  written,
  place,
  now,
  fields,
  people,
  picks,
  trouble,
  pending,
  version,
  href,
  ...on
}: Props) {
  const form = useRef<HTMLFormElement>(null);
  const { kind, at } = written;
  const words = kind === 'suggestion' && at.startsWith('step:');
  const value = kind === 'suggestion' && !words;
  useEffect(() => {
    form.current
      ?.querySelector<HTMLElement>('textarea, input:not([type="hidden"]), select')
      ?.focus({ preventScroll: true });
    form.current?.scrollIntoView({ block: 'nearest' });
  }, [kind, at]);
  const { onCancel } = on;
  useEffect(() => {
    const element = form.current;
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape' && !event.defaultPrevented) onCancel();
    };
    element?.addEventListener('keydown', onKey);
    return () => element?.removeEventListener('keydown', onKey);
  }, [onCancel]);
  const wrong = (name: string) => (trouble?.field === name ? { error: trouble.detail } : {});
  const known = ['text', 'quote', 'replacement', 'value'];
  return (
    <form
      ref={form}
      id="start"
      method="post"
      noValidate
      aria-labelledby="start-title"
      className="heavy-edge act-panel"
      {...picks.catching}
      onSubmit={(event) => {
        event.preventDefault();
        on.onSend();
      }}
    >
      <input type="hidden" name="act" value="thread-start" />
      <input type="hidden" name="kind" value={kind} />
      <input type="hidden" name="anchor" value={at} />
      <input type="hidden" name="version" value={version} />
      <p id="start-title" className="font-serif text-[1.0625rem] font-bold leading-snug">
        {TITLES[kind]} {place}
      </p>
      {trouble && !known.includes(trouble.field ?? '') && (
        <Notice live="alert" title="Not sent">
          <p>{trouble.detail}</p>
        </Notice>
      )}
      {words && (
        <>
          <TextArea
            name="quote"
            id="start-quote"
            label="Words as they stand in the step"
            hint="Enough of them to stand there once. Values between words cannot be quoted."
            fieldClass="max-w-[46rem]"
            rows={2}
            value={written.quote}
            {...wrong('quote')}
            onChange={(event) => on.onWrite({ ...written, quote: event.target.value })}
          />
          <TextArea
            name="replacement"
            id="start-replacement"
            label="Words instead"
            hint="Left empty, the quoted words go."
            fieldClass="max-w-[46rem]"
            rows={2}
            value={written.replacement}
            {...wrong('replacement')}
            onChange={(event) => on.onWrite({ ...written, replacement: event.target.value })}
          />
        </>
      )}
      {value && (
        <div className="flex flex-wrap items-start gap-4">
          {fields.length > 0 && (
            <Select
              name="field"
              id="start-field"
              label="Which value"
              options={fields}
              value={written.field}
              onChange={(event) => on.onWrite({ ...written, field: event.target.value })}
            />
          )}
          <Field
            name="value"
            id="start-value"
            label="Value instead"
            hint={now ? `Proposed: ${now}. A number goes without its unit.` : 'A number goes without its unit.'}
            fieldClass="max-w-[22rem]"
            autoComplete="off"
            value={written.value}
            {...wrong('value')}
            onChange={(event) => on.onWrite({ ...written, value: event.target.value })}
          />
        </div>
      )}
      <div className="max-w-[46rem]">
        <MessageBox
          {...TEXTS[kind]}
          value={written.text}
          people={people}
          error={trouble?.field === 'text' ? trouble.detail : undefined}
          onChange={(text) => on.onWrite({ ...written, text })}
        />
      </div>
      <div className="max-w-[46rem]">
        <PhotoPicker picks={picks} />
      </div>
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" kind="main" pending={pending} pendingText={START_WORDS[kind].doing}>
          {START_WORDS[kind].verb}
        </Button>
        <ButtonLink
          href={href}
          onClick={(event) => {
            event.preventDefault();
            on.onCancel();
          }}
        >
          Not now
        </ButtonLink>
      </div>
    </form>
  );
}
