import { useController, type FieldPath } from 'react-hook-form';
import { readNumber } from '@/domain/writing/numbers';
import type { Draft, ListName } from '@/domain/writing/draft';
import { problemAt } from '@/domain/writing/problems';
import { useDesk, useDraftForm } from './desk';
import { fieldId } from './places';

/** One box of the form: its text, its id, and what is wrong with it once the author has been there. */
export function useBox(path: string) {
  const { control } = useDraftForm();
  const { problems, tried } = useDesk();
  const { field, fieldState } = useController({ control, name: path as FieldPath<Draft> });
  return {
    id: fieldId(path),
    value: typeof field.value === 'string' ? field.value : '',
    set: (text: string) => field.onChange(text),
    onBlur: field.onBlur,
    error: fieldState.isTouched || tried ? problemAt(problems, path) : undefined,
  };
}

/** "1.0" and "1" are the same number. */
const settled = (text: string | undefined) => String(readNumber(text ?? ''));

/** What stood in an entry's field in the base, where it was something else; undefined where nothing changed or all is new. */
export function useWas(list: ListName, key: string, field: string, value: string): string | undefined {
  const { base } = useDesk();
  const before = base?.[list].find((entry) => entry['key'] === key);
  if (!before) return undefined;
  const was = before[field] ?? '';
  return settled(was) === settled(value) ? undefined : was;
}
