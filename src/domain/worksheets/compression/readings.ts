import { atSeaLevel, gaugeFromAbsolute, standardPressure } from '../../measure/atmosphere';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes } from '../findings';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Pressure of the air in the shop, Pa; null where neither barometer nor altitude is known. */
export function airOf({ air, altitude }: Inputs): Worked<number | null> {
  if (air !== undefined) return worked(air);
  return altitude === undefined ? worked(null) : standardPressure(altitude);
}

/** Dry readings as a gauge at sea level would show them, Pa; as they are where the air is not known. */
export function gaugeReadings({ cylinders, scale }: Inputs, air: number | null): Worked<number[]> {
  const found: number[] = [];
  for (const [place, { dry }] of cylinders.entries()) {
    const one = gaugeOf(dry, scale, air);
    if (!one.ok)
      return inBoxes(one, { absolute: `cylinders.${place}.dry`, reading: `cylinders.${place}.dry`, ambient: 'air' });
    found.push(one.value);
  }
  return worked(found);
}

function gaugeOf(dry: number, scale: Inputs['scale'], air: number | null): Worked<number> {
  if (air === null)
    return scale === 'gauge'
      ? worked(dry)
      : refused({ field: 'air', message: 'A gauge that shows the air in the open needs the air pressure.' });
  const gauge = scale === 'gauge' ? worked(dry) : gaugeFromAbsolute(dry, air);
  return gauge.ok ? atSeaLevel(gauge.value, air) : gauge;
}
