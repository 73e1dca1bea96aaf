import type { InputHTMLAttributes, Ref } from 'react';
import { classes } from './classes';
import { FieldShell, tie, type FieldWords } from './FieldShell';

export type FieldProps = FieldWords &
  Omit<InputHTMLAttributes<HTMLInputElement>, 'name' | 'id'> & {
    ref?: Ref<HTMLInputElement>;
    /** Unit that stands after the number, inside the box. */
    unit?: string;
  };

/** One line of text, or a number with its unit. */
export function Field({
  label,
  name,
  id,
  hint,
  hintBelow,
  error,
  fieldClass,
  unit,
  className,
  ref,
  ...input
}: FieldProps) {
  const words = { label, name, id, hint, hintBelow, error, fieldClass };
  return (
    <FieldShell {...words}>
      <span className="relative block">
        <input {...input} {...tie(words)} ref={ref} className={classes('field-box', unit && 'pr-16', className)} />
        {unit && (
          <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-ink-2">{unit}</span>
        )}
      </span>
    </FieldShell>
  );
}
