import { useController } from 'react-hook-form';
import { TextArea } from '@/components/ui/TextArea';
import { useDraftForm } from './desk';
import { fieldId } from './places';

export const REASON_ID = fieldId('reason');

/** Why the change is better. An editor decides by it, so nothing is proposed without it. */
export function ReasonField({ error }: { error: string | undefined }) {
  const { control } = useDraftForm();
  const { field } = useController({ control, name: 'reason' });
  return (
    <TextArea
      label="Why this is better, for the editor"
      hint="What happened at the bench, on how many engines, and how you know."
      name="reason"
      id={REASON_ID}
      value={field.value}
      error={error}
      rows={3}
      maxLength={4000}
      onChange={(event) => field.onChange(event.target.value)}
      onBlur={field.onBlur}
    />
  );
}
