import { Button } from '@/components/ui/Button';
import { boxesOf, joinBoxes, type Entry, type ListName } from '@/domain/writing/draft';
import { BoxCell } from './Cell';
import { useDesk } from './desk';
import { fieldId } from './places';
import { useBox } from './useBox';

const ORDINALS = ['First', 'Second', 'Third', 'Fourth', 'Fifth', 'Sixth'];

/** Several numbers in a row, each in its own box: the passes of a torque, or its turns. */
export function NumberBoxes({
  list,
  index,
  entry,
  field,
  label,
  one,
  unit,
  most,
}: {
  list: ListName;
  index: number;
  entry: Entry;
  field: string;
  label: string;
  /** "pass" makes "First pass". */
  one: string;
  unit: string;
  most: number;
}) {
  const path = `${list}.${index}.${field}`;
  const { id, value, set, error } = useBox(path);
  const { focusSoon } = useDesk();
  const boxes = boxesOf(value);
  return (
    <fieldset id={id} tabIndex={-1} className="flex min-w-0 flex-col gap-1.5">
      <legend className="mb-1.5 font-medium">
        {label}, {unit}
      </legend>
      <div className="flex flex-wrap items-center gap-2">
        {boxes.map((_, at) => (
          <span key={at} className="w-20 border-frame border-ink bg-white">
            <BoxCell
              list={list}
              index={index}
              entry={entry}
              field={field}
              at={at}
              label={`${ORDINALS[at]} ${one}, ${unit}`}
            />
          </span>
        ))}
        {boxes.length < most && (
          <Button
            kind="quiet"
            className="text-small"
            onClick={() => {
              set(joinBoxes([...boxes, '']));
              focusSoon(`${fieldId(path)}-${boxes.length}`);
            }}
          >
            Add a {one}
          </Button>
        )}
        {boxes.length > 0 && (
          <Button kind="quiet" className="text-small" onClick={() => set(joinBoxes(boxes.slice(0, -1)))}>
            Remove the last
          </Button>
        )}
      </div>
      {error && (
        <p id={`${id}-error`} className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
          {error}
        </p>
      )}
    </fieldset>
  );
}
