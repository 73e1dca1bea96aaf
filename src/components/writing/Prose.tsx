import { useState, type ReactNode } from 'react';
import { FieldShell, tie } from '@/components/ui/FieldShell';
import type { SourceProblem } from '@/domain/procedure/types';
import type { Where } from '@/domain/writing/field/schema';
import { useDraftForm } from './desk';
import type { FieldHandle, LayoutHandle } from './fieldHandle';
import { LayoutMenu } from './LayoutMenu';
import { PlainProse } from './PlainProse';
import { StillWords } from './StillWords';
import { useBox } from './useBox';
import { useFieldEditor } from './useFieldEditor';

const LEAST = '9.5rem';
const KEYS = 'Tab moves points of a list and goes through a table; Escape, then Tab leaves the field.';

/** Why the words stand there as they are stored. */
type Plain = { why: 'asked' } | { why: 'unreadable'; problem: SourceProblem };

/**
 * The words of a step or of the introduction. Their values are chips; where they cannot be shown so, because they are half
 * written as signs, they are text, and it is said why.
 *
 * @param onField what the buttons under the field act on; null while there is nothing to act on
 */
export function Prose({
  path,
  where,
  label,
  hint,
  onField,
}: {
  path: 'intro' | `steps.${number}.body`;
  where: Where;
  label: string;
  hint?: ReactNode;
  onField: (handle: FieldHandle | null) => void;
}) {
  const { id, value, set, onBlur, error } = useBox(path);
  const { getValues } = useDraftForm();
  const { editor: Editor, failed } = useFieldEditor();
  const [plain, setPlain] = useState<Plain | null>(null);
  // Whether the caret was here, or was asked to come here, before there was a field to take it.
  const [wanted, setWanted] = useState(false);
  const [layout, setLayout] = useState<LayoutHandle | null>(null);
  const words = { label, hint, name: path, id, error };
  const asText = plain !== null || failed;
  const { 'aria-describedby': describedBy, 'aria-invalid': invalid } = tie(words);
  return (
    <FieldShell
      {...words}
      labelled={asText ? 'control' : 'group'}
      beside={layout && <LayoutMenu field={layout} onText={() => setPlain({ why: 'asked' })} />}
    >
      {asText ? (
        <PlainProse words={words} value={value} set={set} onBlur={onBlur} onHandle={onField} least={LEAST} />
      ) : Editor ? (
        <Editor
          where={where}
          value={value}
          latest={() => getValues(path)}
          set={set}
          onBlur={onBlur}
          onHandle={(handle) => {
            setLayout(handle);
            onField(handle);
          }}
          onUnreadable={(problem) => setPlain({ why: 'unreadable', problem })}
          focus={wanted}
          attributes={{
            id,
            role: 'textbox',
            'aria-multiline': 'true',
            'aria-labelledby': `${id}-label`,
            'aria-describedby': [describedBy, `${id}-keys`].filter(Boolean).join(' '),
            ...(invalid && { 'aria-invalid': 'true' }),
            spellcheck: 'true',
            class: 'field-box field-prose',
            style: `min-height: ${LEAST}`,
          }}
        />
      ) : (
        <StillWords id={id} value={value} least={LEAST} onFocus={() => setWanted(true)} />
      )}
      {asText ? (
        <p className="border-l-[8px] border-rule pl-2.5 leading-snug">
          {failed
            ? 'The field with the values among the words could not be loaded, so they stand here as they are stored. '
            : plain?.why === 'unreadable'
              ? `These words stand here as they are stored, because they cannot be read yet. Line ${plain.problem.line}: ${plain.problem.message} `
              : 'These words stand here as they are stored. '}
          {!failed && (
            <button
              type="button"
              className="inline-flex min-h-[1.75rem] items-center underline underline-offset-[3px]"
              onClick={() => {
                setWanted(true);
                setPlain(null);
              }}
            >
              {plain?.why === 'unreadable' ? 'Try again with the values as chips' : 'Show the values as chips'}
            </button>
          )}
        </p>
      ) : (
        <p id={`${id}-keys`} className="sr-only">
          {KEYS}
        </p>
      )}
    </FieldShell>
  );
}
