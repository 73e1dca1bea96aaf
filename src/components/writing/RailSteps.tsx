import {
  closestCenter,
  DndContext,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
  type Announcements,
} from '@dnd-kit/core';
import {
  SortableContext,
  sortableKeyboardCoordinates,
  useSortable,
  verticalListSortingStrategy,
} from '@dnd-kit/sortable';
import { CSS } from '@dnd-kit/utilities';
import type { Step } from '@/domain/procedure/types';
import { useDesk } from './desk';
import { Grip } from './Grip';
import { samePlace } from './places';
import { RailLink } from './RailLink';
import { useSteps } from './useSteps';

function RailStep({ step, index, faults }: { step: Step; index: number; faults: number }) {
  const { place } = useDesk();
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, transform, transition, isDragging } = useSortable({
    id: step.id,
  });
  return (
    <li
      ref={setNodeRef}
      style={{ transform: CSS.Translate.toString(transform), transition }}
      className={isDragging ? 'relative z-10 bg-wash' : undefined}
    >
      <RailLink
        to={{ step: step.id }}
        on={samePlace(place, { step: step.id })}
        number={index + 1}
        faults={faults}
        before={
          <button
            type="button"
            ref={setActivatorNodeRef}
            {...attributes}
            {...listeners}
            aria-label={`Move step ${index + 1}: ${step.title || 'no title yet'}`}
            className="grid min-h-[40px] w-9 shrink-0 cursor-grab touch-none content-start justify-items-center pt-[0.85rem] text-ink-2 hover:bg-wash active:cursor-grabbing"
          >
            <Grip />
          </button>
        }
      >
        {step.title || 'No title yet'}
      </RailLink>
    </li>
  );
}

/** The steps in their order, to be chosen and to be moved, by pointer or by keyboard. */
export function RailSteps() {
  const { draft, problems } = useDesk();
  const { move, add } = useSteps();
  const { steps } = draft;
  const at = (id: string | number) => steps.findIndex((step) => step.id === id);
  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 4 } }),
    useSensor(KeyboardSensor, { coordinateGetter: sortableKeyboardCoordinates }),
  );
  const place = (id: string | number) => `place ${at(id) + 1} of ${steps.length}`;
  const announcements: Announcements = {
    onDragStart: ({ active }) => `Picked up step ${at(active.id) + 1}, ${place(active.id)}.`,
    onDragOver: ({ over }) => (over ? `Now at ${place(over.id)}.` : 'Not over the list of steps.'),
    onDragEnd: ({ over }) => (over ? `Put down at ${place(over.id)}.` : 'Put back.'),
    onDragCancel: () => 'Put back where it was.',
  };
  return (
    <DndContext
      id="steps"
      sensors={sensors}
      collisionDetection={closestCenter}
      accessibility={{
        announcements,
        screenReaderInstructions: {
          draggable:
            'Press space to pick the step up, the arrow keys to move it, space to put it down, Escape to leave it where it was.',
        },
      }}
      onDragEnd={({ active, over }) => {
        if (over && over.id !== active.id) move(at(active.id), at(over.id));
      }}
    >
      <SortableContext items={steps.map((step) => step.id)} strategy={verticalListSortingStrategy}>
        <ol>
          {steps.map((step, index) => (
            <RailStep
              key={step.id}
              step={step}
              index={index}
              faults={
                problems.filter((p) => p.path?.startsWith(`steps.${index}.`) || p.path === `steps.${index}`).length
              }
            />
          ))}
        </ol>
      </SortableContext>
      <button
        type="button"
        onClick={() => add()}
        className="grid min-h-[40px] w-full grid-cols-[2.25rem_1.75rem_1fr] items-center pr-3.5 text-left font-semibold text-petrol hover:bg-wash"
      >
        <span />
        <span aria-hidden="true">+</span>
        Add a step
      </button>
    </DndContext>
  );
}
