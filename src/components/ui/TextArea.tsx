import type { Ref, TextareaHTMLAttributes } from 'react';
import { classes } from './classes';
import { FieldShell, tie, type FieldWords } from './FieldShell';

/** Several lines of text, set in the serif that prose is read in. */
export function TextArea({
  label,
  name,
  id,
  hint,
  error,
  fieldClass,
  className,
  ref,
  ...area
}: FieldWords & Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, 'name' | 'id'> & { ref?: Ref<HTMLTextAreaElement> }) {
  const words = { label, name, id, hint, error, fieldClass };
  return (
    <FieldShell {...words}>
      <textarea
        rows={4}
        {...area}
        {...tie(words)}
        ref={ref}
        className={classes('field-box resize-y font-serif text-prose', className)}
      />
    </FieldShell>
  );
}
