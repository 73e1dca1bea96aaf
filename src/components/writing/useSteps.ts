import type { Step } from '@/domain/procedure/types';
import { provisionalId, settledId } from '@/domain/writing/ids';
import { useDesk, useDraftForm } from './desk';

/** Keys of the fields of steps whose id was settled while they were on the screen: the fields must stay the same ones. */
const keptKeys = new Map<string, string>();

/** A React key for the fields of a step, which outlives the settling of its id. */
export const fieldsKey = (id: string) => keptKeys.get(id) ?? id;

/** Adding, moving, naming and deleting steps. A step's id is never changed once it has had a title. */
export function useSteps() {
  const { getValues, setValue } = useDraftForm();
  const { choose, focusSoon, offerUndo } = useDesk();
  const change = (steps: Step[]) => setValue('steps', steps, { shouldDirty: true });

  const move = (from: number, to: number) => {
    const steps = getValues('steps');
    const step = steps[from];
    if (!step || to < 0 || to >= steps.length) return;
    change(steps.toSpliced(from, 1).toSpliced(to, 0, step));
  };

  /** Adds a blank step behind the one at `after`, or at the end. */
  const add = (after?: number) => {
    const steps = getValues('steps');
    const id = provisionalId(steps.map((step) => step.id));
    const at = after === undefined ? steps.length : after + 1;
    change(steps.toSpliced(at, 0, { id, title: '', cautions: [], body: '' }));
    choose({ step: id });
    focusSoon(`f-steps-${at}-title`);
  };

  const remove = (at: number) => {
    const steps = getValues('steps');
    const step = steps[at];
    if (!step) return;
    const rest = steps.toSpliced(at, 1);
    change(rest);
    const next = rest[Math.min(at, rest.length - 1)];
    choose(next ? { step: next.id } : 'sheet');
    offerUndo(`Step ${at + 1} deleted: ${step.title || 'without a title'}.`, () => {
      change(getValues('steps').toSpliced(at, 0, step));
      choose({ step: step.id });
    });
  };

  /** Gives a new step the id it keeps, made from its first title. */
  const settle = (at: number) => {
    const steps = getValues('steps');
    const step = steps[at];
    if (!step) return;
    const id = settledId(
      step.id,
      step.title,
      steps.map((other) => other.id),
    );
    if (id === step.id) return;
    keptKeys.set(id, fieldsKey(step.id));
    change(steps.with(at, { ...step, id }));
    choose({ step: id }, { replace: true });
  };

  return { move, add, remove, settle };
}
