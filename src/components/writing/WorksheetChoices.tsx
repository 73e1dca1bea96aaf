import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { entryName } from '@/domain/writing/draft';
import type { Piece } from '@/domain/writing/insert';
import { readingsOf, worksheets } from './choices';
import { useDesk } from './desk';
import { MenuItem } from './Menu';

/** Which limits are read and written down here, or one of the worksheets that compute. */
export function WorksheetChoices({
  first = [],
  onChoose,
}: {
  /** Limits that are chosen already. */
  first?: readonly string[];
  onChoose: (piece: Piece) => void;
}) {
  const { draft } = useDesk();
  const [keys, setKeys] = useState<readonly string[]>(first.filter(Boolean));
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
          <Button className="mt-1" disabled={keys.length === 0} onClick={() => onChoose(readingsOf(keys))}>
            Put in the readings
          </Button>
        </fieldset>
      )}
      {worksheets.map((worksheet) => (
        <MenuItem key={worksheet.key} onChoose={() => onChoose(worksheet.piece)}>
          {worksheet.name}
        </MenuItem>
      ))}
    </>
  );
}
