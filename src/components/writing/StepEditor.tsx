import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { CautionsAhead } from './CautionsAhead';
import { useDesk } from './desk';
import type { FieldHandle } from './fieldHandle';
import { InsertRow } from './InsertRow';
import { Prose } from './Prose';
import { RemarksHere } from './Returned';
import { useBox } from './useBox';
import { fieldsKey, useSteps } from './useSteps';
import { ValuesBehind } from './ValuesBehind';

function Title({ index }: { index: number }) {
  const { id, value, set, onBlur, error } = useBox(`steps.${index}.title`);
  const { settle } = useSteps();
  return (
    <Field
      label={`Step ${index + 1}, what to do`}
      name={`steps.${index}.title`}
      id={id}
      value={value}
      error={error}
      maxLength={200}
      autoComplete="off"
      placeholder="An order, short enough to be shouted"
      className="py-2.5 font-serif font-bold"
      onChange={(event) => set(event.target.value)}
      onBlur={() => {
        onBlur();
        settle(index);
      }}
    />
  );
}

/** The fields of one step. They are new ones for another step, so that undo stays with its own words. */
function StepFields({ index, body }: { index: number; body: string }) {
  const [field, setField] = useState<FieldHandle | null>(null);
  return (
    <>
      <Title index={index} />
      <CautionsAhead index={index} />
      <div className="flex flex-col gap-2.5">
        <Prose path={`steps.${index}.body`} where="step" label="How" onField={setField} />
        <InsertRow field={field} step={index} />
      </div>
      <ValuesBehind body={body} />
    </>
  );
}

/** Everything of one step: its order, what stands ahead of it, how it is done, the values it works to. */
export function StepEditor({ index }: { index: number }) {
  const { draft } = useDesk();
  const { move, add, remove } = useSteps();
  const step = draft.steps[index];
  if (!step) return null;
  const last = draft.steps.length - 1;
  return (
    <div className="flex flex-col gap-5">
      <RemarksHere anchor={`step:${step.id}`} />
      <StepFields key={`${fieldsKey(step.id)}:${index}`} index={index} body={step.body} />
      <div className="-mx-2 flex flex-wrap gap-x-2">
        <Button
          kind="quiet"
          aria-disabled={index === 0}
          className="text-small aria-disabled:text-ink-2 aria-disabled:no-underline"
          onClick={() => move(index, index - 1)}
        >
          Move up
        </Button>
        <Button
          kind="quiet"
          aria-disabled={index === last}
          className="text-small aria-disabled:text-ink-2 aria-disabled:no-underline"
          onClick={() => move(index, index + 1)}
        >
          Move down
        </Button>
        <Button kind="quiet" className="text-small" onClick={() => add(index)}>
          Add a step after this one
        </Button>
        <Button kind="quiet" className="text-small sm:ml-auto" onClick={() => remove(index)}>
          Delete the step
        </Button>
      </div>
    </div>
  );
}
