import { Fragment, useState, type RefObject } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { entryName, type ListName } from '@/domain/writing/draft';
import type { Piece } from '@/domain/writing/insert';
import { CautionMenu } from './CautionsAhead';
import { CHOICES, HOLD, PIECE_OF, readingsOf, worksheets, type Choice } from './choices';
import { useDesk } from './desk';
import { Menu, MenuItem } from './Menu';
import { NewEntry } from './NewEntry';
import { ONE_OF } from './places';
import { insertInto } from './Prose';
import { useEntries } from './useEntries';

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

/** Which limits are read and written down here, or one of the worksheets that compute. */
function WorksheetMenu({ put, close }: { put: (piece: Piece) => void; close: () => void }) {
  const { draft } = useDesk();
  const [keys, setKeys] = useState<string[]>([]);
  const choose = (piece: Piece) => {
    close();
    put(piece);
  };
  return (
    <>
      {draft.limits.length > 0 && (
        <fieldset className="border-b border-hair px-3.5 pb-3">
          <legend className="pt-1.5 text-small text-ink-2">Readings to write down</legend>
          {draft.limits.map((limit) => {
            const key = limit['key'] ?? '';
            return (
              <Checkbox
                key={key}
                data-item
                label={entryName('limits', limit)}
                checked={keys.includes(key)}
                onChange={(event) =>
                  setKeys(event.target.checked ? [...keys, key] : keys.filter((other) => other !== key))
                }
              />
            );
          })}
          <Button className="mt-1" disabled={keys.length === 0} onClick={() => choose(readingsOf(keys))}>
            Put in the readings
          </Button>
        </fieldset>
      )}
      {worksheets.map((worksheet) => (
        <MenuItem key={worksheet.key} onChoose={() => choose(worksheet.piece)}>
          {worksheet.name}
        </MenuItem>
      ))}
    </>
  );
}

/**
 * Buttons under the words that put values, drawings and holds in at the caret, and cautions ahead of the step.
 *
 * @param step index of the step; none in the introduction, which has no holds, worksheets or cautions
 */
export function InsertRow({ area, step }: { area: RefObject<HTMLTextAreaElement | null>; step?: number }) {
  const { draft } = useDesk();
  const put = (piece: Piece) => {
    if (area.current) insertInto(area.current, piece);
  };
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
          <Menu label="Worksheet">{(close) => <WorksheetMenu put={put} close={close} />}</Menu>
        </>
      )}
    </div>
  );
}
