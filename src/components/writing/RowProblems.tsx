import { useFormState } from 'react-hook-form';
import type { ListName } from '@/domain/writing/draft';
import { problemAt } from '@/domain/writing/problems';
import { useDesk, useDraftForm } from './desk';
import { fieldId } from './places';

/** What is wrong in a row of a table, right under it; each sentence is tied to its cell. */
export function RowProblems({ list, index, fields }: { list: ListName; index: number; fields: readonly string[] }) {
  const { control, getFieldState } = useDraftForm();
  const state = useFormState({ control });
  const { problems, tried } = useDesk();
  const found = fields.flatMap((field) => {
    const path = `${list}.${index}.${field}` as `torques.${number}.nm`;
    const text = tried || getFieldState(path, state).isTouched ? problemAt(problems, path) : undefined;
    return text ? [{ id: `${fieldId(path)}-error`, text }] : [];
  });
  return found.map(({ id, text }) => (
    <p key={id} id={id} className="border-l-[8px] border-ink bg-white px-2.5 py-1 font-medium leading-snug">
      {text}
    </p>
  ));
}
