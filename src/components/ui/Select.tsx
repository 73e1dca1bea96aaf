import type { Ref, SelectHTMLAttributes } from 'react';
import { classes } from './classes';
import { FieldShell, tie, type FieldWords } from './FieldShell';

export interface Option {
  value: string;
  label: string;
}

/** One of a closed list. With few options, Segmented shows them all at once. */
export function Select({
  label,
  name,
  id,
  hint,
  hintBelow,
  error,
  fieldClass,
  options,
  className,
  ref,
  ...select
}: FieldWords &
  Omit<SelectHTMLAttributes<HTMLSelectElement>, 'name' | 'id'> & {
    options: readonly Option[];
    ref?: Ref<HTMLSelectElement>;
  }) {
  const words = { label, name, id, hint, hintBelow, error, fieldClass };
  return (
    <FieldShell {...words}>
      <select {...select} {...tie(words)} ref={ref} className={classes('field-box', className)}>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldShell>
  );
}
