import { useMemo } from 'react';
import { ClampLine } from '@/components/sheet/ClampLine';
import { OrderDrawing } from '@/components/sheet/OrderDrawing';
import { TextArea } from '@/components/ui/TextArea';
import type { Torque } from '@/domain/procedure/schema';
import { boxesOf, type Entry } from '@/domain/writing/draft';
import { readNumbers } from '@/domain/writing/numbers';
import { torqueOf } from '@/domain/writing/procedureOf';
import { TextBox } from './fields';
import { NumberBoxes } from './NumberBoxes';
import { useBox } from './useBox';

const isPair = (place: (number | string)[]): place is [number, number] =>
  place.length === 2 && place.every((n) => typeof n === 'number');

/** As much of the torque as can be drawn; null while a place cannot be read. */
function drawable(entry: Entry): Torque | null {
  const places = (entry['positions'] ?? '')
    .split('\n')
    .filter((line) => line.trim())
    .map(readNumbers);
  if (places.length === 0 || !places.every(isPair)) return null;
  const order = readNumbers(entry['order'] ?? '').filter((n): n is number => typeof n === 'number');
  const complete = order.length === places.length && order.every((n) => n >= 1 && n <= places.length);
  const torque = { name: entry['name'] ?? '', positions: places, ...(complete ? { order } : {}) };
  return torque as unknown as Torque;
}

/** Passes, turns, places and order of a torque, with the drawing that the sheet will show. */
export function TorqueMore({ index, entry }: { index: number; entry: Entry }) {
  const path = `torques.${index}`;
  const places = useBox(`${path}.positions`);
  const torque = drawable(entry);
  const whole = useMemo(() => torqueOf(entry), [entry]);
  const turns = boxesOf(entry['angles']).length > 0 || Boolean(entry['angleTolerance']);
  return (
    <>
      <div aria-live="polite" className="empty:hidden sm:col-span-full sm:max-w-[30rem]">
        {whole && <ClampLine torque={whole} tellAll />}
      </div>
      <div className="flex flex-wrap gap-x-10 gap-y-4 sm:col-span-full">
        <NumberBoxes
          list="torques"
          index={index}
          entry={entry}
          field="passes"
          label="Passes before the final torque"
          one="pass"
          unit="N·m"
          most={6}
        />
        <NumberBoxes
          list="torques"
          index={index}
          entry={entry}
          field="angles"
          label="Turns after the final torque"
          one="turn"
          unit="degrees"
          most={4}
        />
        {turns && <TextBox path={`${path}.angleTolerance`} label="± on each turn, degrees" fieldClass="w-44" />}
      </div>
      <details open={Boolean(entry['positions'] || entry['order'])} className="sm:col-span-full">
        <summary className="inline-flex min-h-touch cursor-pointer items-center font-medium underline decoration-rule underline-offset-[3px]">
          Where the bolts stand, and the order they are tightened in
        </summary>
        <div className="grid gap-5 pt-1 sm:grid-cols-2">
          <div className="flex flex-col gap-4">
            <TextArea
              label="Places"
              hint="One bolt a line, seen from its head: mm to the right, mm down. Bolt 1 first."
              name={`${path}.positions`}
              id={places.id}
              value={places.value}
              error={places.error}
              rows={6}
              className="!font-sans !text-base"
              onChange={(event) => places.set(event.target.value)}
              onBlur={places.onBlur}
            />
            <TextBox path={`${path}.order`} label="Order" hint="Bolt numbers, the first to be tightened first." />
          </div>
          {torque ? (
            <OrderDrawing torque={torque} />
          ) : (
            <p className="self-center text-ink-2">
              With a place for every bolt the order is drawn here, as the sheet will show it.
            </p>
          )}
        </div>
      </details>
    </>
  );
}
