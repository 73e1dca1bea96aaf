import { useId, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { linkFault } from '@/domain/procedure/links';
import { Panel } from './Panel';

/** Asks where the selected words lead. */
export function LinkPanel({
  first,
  at,
  onClose,
  onLink,
}: {
  first: string;
  at: { left: number; top: number };
  onClose: (back: boolean) => void;
  onLink: (href: string | null) => void;
}) {
  const id = useId();
  const [href, setHref] = useState(first);
  const [asked, setAsked] = useState(false);
  const fault = linkFault(href.trim());
  const set = () => {
    setAsked(true);
    if (fault === null) onLink(href.trim());
  };
  return (
    <Panel label="Link" at={at} onClose={onClose}>
      <div className="flex flex-col gap-2.5 px-3.5 py-2">
        <Field
          label="Address"
          name="link"
          id={`${id}-link`}
          data-item
          value={href}
          hint="https:// or a path of this book, such as /procedures/P-0142."
          error={asked ? (fault ?? undefined) : undefined}
          autoComplete="off"
          inputMode="url"
          onChange={(event) => setHref(event.target.value)}
          onKeyDown={(event) => {
            if (event.key !== 'Enter') return;
            event.preventDefault();
            set();
          }}
        />
        <div className="flex gap-2.5">
          <Button onClick={set}>{first ? 'Change the link' : 'Set the link'}</Button>
          {first && (
            <Button kind="quiet" onClick={() => onLink(null)}>
              Take the link away
            </Button>
          )}
        </div>
      </div>
    </Panel>
  );
}
