import { useEffect, useRef, type ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Select, type Option } from '@/components/ui/Select';
import { TextArea } from '@/components/ui/TextArea';
import type { Written } from './keptReason';
import { ACT_WORDS, type ReviewAct } from './words';

interface PanelProps {
  title: string;
  act: ReviewAct;
  /** The version that is judged. */
  version: number;
  /** The page without the panel, for where no script runs. */
  href: string;
  button: string;
  pending: boolean;
  onSend: () => void;
  onCancel: () => void;
  children: ReactNode;
}

/** What an act asks for before it is done, in place, so that both texts stay in sight. */
export function ActPanel({ title, act, version, href, button, pending, onSend, onCancel, children }: PanelProps) {
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    const first = form.current?.querySelector<HTMLElement>('textarea, button[type="submit"]');
    first?.focus({ preventScroll: true });
    form.current?.scrollIntoView({ block: 'nearest' });
  }, []);
  useEffect(() => {
    const element = form.current;
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape') onCancel();
    };
    element?.addEventListener('keydown', onKey);
    return () => element?.removeEventListener('keydown', onKey);
  }, [onCancel]);
  return (
    <form
      ref={form}
      id="give"
      method="post"
      noValidate
      aria-labelledby="give-title"
      className="heavy-edge act-panel"
      onSubmit={(event) => {
        event.preventDefault();
        onSend();
      }}
    >
      <input type="hidden" name="act" value={act} />
      <input type="hidden" name="version" value={version} />
      <p id="give-title" className="font-serif text-[1.0625rem] font-bold leading-snug">
        {title}
      </p>
      {children}
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" kind="main" pending={pending} pendingText={ACT_WORDS[act].doing}>
          {button}
        </Button>
        <ButtonLink
          href={href}
          onClick={(event) => {
            event.preventDefault();
            onCancel();
          }}
        >
          Not now
        </ButtonLink>
      </div>
    </form>
  );
}

/** The two fields of a return or a decline: why, and where. */
export function ReasonFields({
  written,
  author,
  places,
  error,
  onWrite,
}: {
  written: Written;
  author: string;
  /** What a reason can be tied to. */
  places: readonly Option[];
  error: string | null;
  onWrite: (written: Written) => void;
}) {
  const returning = written.act === 'return';
  return (
    <>
      <TextArea
        name="reason"
        id="give-reason"
        label={returning ? 'What must change, and why' : 'Why it is declined'}
        hint={
          returning
            ? `${author} reads this, changes the text and sends it in again.`
            : 'It cannot be taken up again. The proposal and this reason stay as a record.'
        }
        error={error ?? undefined}
        fieldClass="max-w-[46rem]"
        value={written.text}
        maxLength={4000}
        onChange={(event) => onWrite({ ...written, text: event.target.value })}
      />
      <Select
        name="anchor"
        id="give-anchor"
        label="Where"
        options={places}
        value={written.anchor}
        onChange={(event) => onWrite({ ...written, anchor: event.target.value })}
        fieldClass="max-w-[30rem]"
      />
    </>
  );
}
