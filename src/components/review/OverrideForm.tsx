import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { TextArea } from '@/components/ui/TextArea';
import { keepOverride, keptOverride } from './keptOverride';

interface OverrideFormProps {
  proposalId: string;
  /** The version that is judged. */
  version: number;
  torque: string;
  /** What was typed and refused, where no script ran. */
  typed: string;
  error: string | null;
  pending: boolean;
  /** Sends the reason; `onDone` once it was taken. */
  onSend: (reason: string, onDone: () => void) => void;
}

/** Where an editor writes why a torque past proof load stays. Folded away: it must not look like the next thing to press. */
export function OverrideForm({ proposalId, version, torque, typed, error, pending, onSend }: OverrideFormProps) {
  const [text, setText] = useState(typed);
  const [open, setOpen] = useState(typed !== '' || error !== null);
  useEffect(() => {
    const kept = keptOverride(proposalId, torque);
    if (!kept || typed) return undefined;
    const frame = requestAnimationFrame(() => {
      setText(kept);
      setOpen(true);
    });
    return () => cancelAnimationFrame(frame);
  }, [proposalId, torque, typed]);
  return (
    <details className="override" open={open || error !== null} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>Override the clamp check</summary>
      <form
        method="post"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          onSend(text, () => keepOverride(proposalId, torque, ''));
        }}
      >
        <input type="hidden" name="act" value="override" />
        <input type="hidden" name="version" value={version} />
        <input type="hidden" name="torque" value={torque} />
        <TextArea
          name="reason"
          id={`override-${torque}`}
          label="Why this torque is right all the same"
          hint="What it goes by: the maker’s figure, a test, a bolt made to be stretched. It stays in the history of the sheet, under your name."
          error={error ?? undefined}
          fieldClass="max-w-[46rem]"
          rows={3}
          value={text}
          maxLength={4000}
          onChange={(event) => {
            setText(event.target.value);
            keepOverride(proposalId, torque, event.target.value);
          }}
        />
        <Button type="submit" pending={pending} pendingText="Overriding">
          Override with this reason
        </Button>
      </form>
    </details>
  );
}
