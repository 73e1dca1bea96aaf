import type { ReactNode } from 'react';
import { classes } from './classes';

/** What every field has besides its control. */
export interface FieldWords {
  /** Says what to enter; always visible. */
  label: ReactNode;
  /** The HTML name; the id too, unless one is given. */
  name: string;
  id?: string;
  hint?: ReactNode;
  /** Under the control, so that boxes beside each other stand on one line however long their hints are. */
  hintBelow?: boolean;
  /** What is wrong and what to do about it. */
  error?: string | undefined;
  /** Classes of the whole field, for its place in a layout. */
  fieldClass?: string;
}

/** Ids and ARIA attributes that tie a control to its label, hint and error. */
export function tie({ name, id = name, hint, error }: FieldWords) {
  const describedBy = classes(hint ? `${id}-hint` : null, error ? `${id}-error` : null);
  return {
    id,
    name,
    'aria-describedby': describedBy || undefined,
    'aria-invalid': error ? true : undefined,
  };
}

/** Label above, hint under it, the control, and the error right beside what it speaks of. */
export function FieldShell({
  children,
  labelled = 'control',
  beside,
  ...words
}: FieldWords & {
  children: ReactNode;
  /** `group`: the control is not one that a label can be for, and names itself by the label's id, `<id>-label`. */
  labelled?: 'control' | 'group';
  /** At the other end of the label's line. */
  beside?: ReactNode;
}) {
  const { id } = tie(words);
  const hint = words.hint && (
    <p id={`${id}-hint`} className={classes('text-small text-ink-2', !words.hintBelow && '-mt-1')}>
      {words.hint}
    </p>
  );
  return (
    <div className={classes('flex min-w-0 flex-col gap-1.5', words.fieldClass)}>
      {labelled === 'control' ? (
        <label id={`${id}-label`} htmlFor={id} className="font-medium">
          {words.label}
        </label>
      ) : (
        <div className="flex items-end justify-between gap-4">
          <span id={`${id}-label`} className="font-medium">
            {words.label}
          </span>
          {beside}
        </div>
      )}
      {!words.hintBelow && hint}
      {children}
      {words.error && (
        <p id={`${id}-error`} className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
          {words.error}
        </p>
      )}
      {words.hintBelow && hint}
    </div>
  );
}
