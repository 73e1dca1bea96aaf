import type { ReactNode } from 'react';
import { Field } from '@/components/ui/Field';
import { Select, type Option } from '@/components/ui/Select';
import { TextArea } from '@/components/ui/TextArea';
import { useBox } from './useBox';

interface BoxProps {
  path: string;
  label: ReactNode;
  hint?: ReactNode;
  fieldClass?: string;
}

export function TextBox({ path, className, unit, ...words }: BoxProps & { className?: string; unit?: string }) {
  const { id, value, set, onBlur, error } = useBox(path);
  return (
    <Field
      {...words}
      name={path}
      id={id}
      error={error}
      value={value}
      unit={unit}
      className={className}
      autoComplete="off"
      onChange={(event) => set(event.target.value)}
      onBlur={onBlur}
    />
  );
}

/** Some lines of plain text that are kept as one line. */
export function LongBox({ path, rows = 2, ...words }: BoxProps & { rows?: number }) {
  const { id, value, set, onBlur, error } = useBox(path);
  return (
    <TextArea
      {...words}
      name={path}
      id={id}
      error={error}
      value={value}
      rows={rows}
      autoComplete="off"
      className="long-box !font-sans !text-base"
      onChange={(event) => set(event.target.value.replace(/\s*\n\s*/g, ' '))}
      onBlur={onBlur}
    />
  );
}

/** `blank` is the words for nothing chosen. A value that is not among the options stays and is shown. */
export function ChoiceBox({
  path,
  options,
  blank,
  ...words
}: BoxProps & { options: readonly Option[]; blank?: string }) {
  const { id, value, set, onBlur, error } = useBox(path);
  const all = [
    ...(blank !== undefined || value === '' ? [{ value: '', label: blank ?? 'Choose' }] : []),
    ...options,
    ...(value !== '' && !options.some((option) => option.value === value) ? [{ value, label: value }] : []),
  ];
  return (
    <Select
      {...words}
      name={path}
      id={id}
      error={error}
      value={value}
      options={all}
      onChange={(event) => set(event.target.value)}
      onBlur={onBlur}
    />
  );
}
