import { pressureAtLoss, type LeakReading } from '../../measure/leakDown';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes } from '../findings';
import type { fields } from './schema';

/** A tester that shows the loss itself has no gauge to name; any supply gives the same loss back. */
const ANY_SUPPLY = 100_000;

/** Each cylinder as two pressures, Pa, whether the tester showed pressures or the loss; null where it was not tested. */
export function leakReadings({ supply, cylinders }: Values<typeof fields>): Worked<(LeakReading | null)[]> {
  const found: (LeakReading | null)[] = [];
  for (const [place, { pressure, loss, heard }] of cylinders.entries()) {
    const at = `cylinders.${place}`;
    const sounds = heard === undefined ? {} : { heard: [heard] };
    if (pressure !== undefined) {
      if (supply === undefined)
        return refused({ field: 'supply', message: 'A pressure on the second gauge needs the supply pressure.' });
      found.push({ supply, cylinder: pressure, ...sounds });
      continue;
    }
    if (loss === undefined && heard !== undefined)
      return refused({ field: `${at}.pressure`, message: `Cylinder ${place + 1} needs its pressure or its loss.` });
    if (loss === undefined) {
      found.push(null);
      continue;
    }
    const cylinder = pressureAtLoss(supply ?? ANY_SUPPLY, loss);
    if (!cylinder.ok) return inBoxes(cylinder, { loss: `${at}.loss` });
    found.push({ supply: supply ?? ANY_SUPPLY, cylinder: cylinder.value, ...sounds });
  }
  return worked(found);
}
