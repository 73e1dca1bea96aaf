import { Fragment, useState } from 'react';
import type { ListName } from '@/domain/writing/draft';
import type { Piece } from '@/domain/writing/insert';
import { CautionMenu } from './CautionsAhead';
import { CHOICES, HOLD, PIECE_OF, type Choice } from './choices';
import { useDesk } from './desk';
import type { FieldHandle } from './fieldHandle';
import { Menu, MenuItem } from './Menu';
import { NewEntry } from './NewEntry';
import { ONE_OF } from './places';
import { useEntries } from './useEntries';
import { WorksheetChoices } from './WorksheetChoices';

/** The sheet's values of one kind by their names, and a new one, which is made and goes in at once. */
function ChoiceMenu({
  label,
  list,
  choices,
  put,
  close,
}: {
  label: string;
  list: ListName;
  choices: readonly Choice[];
  put: (piece: Piece) => void;
  close: () => void;
}) {
  const [naming, setNaming] = useState(choices.length === 0);
  const { add } = useEntries(list);
  if (naming)
    return (
      <div className="px-3.5 py-2" data-item tabIndex={-1}>
        <NewEntry
          list={list}
          onAdd={(name) => {
            const piece = PIECE_OF[list]?.(add(name));
            close();
            if (piece) put(piece);
          }}
        />
      </div>
    );
  return (
    <>
      {choices.map((choice) => (
        <MenuItem
          key={choice.key}
          detail={choice.detail}
          onChoose={() => {
            close();
            put(choice.piece);
          }}
        >
          {choice.name}
        </MenuItem>
      ))}
      <MenuItem onChoose={() => setNaming(true)}>
        <span className="text-petrol underline underline-offset-[3px]">
          New {label === 'Drawing' ? 'drawing' : ONE_OF[list]}
        </span>
      </MenuItem>
    </>
  );
}

/**
 * Buttons under the words that put values, drawings and holds in at the caret, and cautions ahead of the step.
 *
 * @param step index of the step; none in the introduction, which has no holds, worksheets or cautions
 */
export function InsertRow({ field, step }: { field: FieldHandle | null; step?: number }) {
  const { draft } = useDesk();
  const put = (piece: Piece) => field?.put(piece);
  return (
    <div role="group" aria-label="Put in at the caret" className="flex flex-wrap gap-2">
      {CHOICES.map(({ label, list, choices }) => (
        <Fragment key={label}>
          <Menu label={label}>
            {(close) => <ChoiceMenu label={label} list={list} choices={choices(draft)} put={put} close={close} />}
          </Menu>
          {label === 'Limit' && step !== undefined && <CautionMenu index={step} />}
        </Fragment>
      ))}
      {step !== undefined && (
        <>
          <button
            type="button"
            onClick={() => put(HOLD)}
            className="min-h-[40px] rounded border border-rule bg-white px-3 font-medium hover:bg-wash"
          >
            Hold point
          </button>
          <Menu label="Worksheet">
            {(close) => (
              <WorksheetChoices
                onChoose={(piece) => {
                  close();
                  put(piece);
                }}
              />
            )}
          </Menu>
        </>
      )}
    </div>
  );
}
