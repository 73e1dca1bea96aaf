import { atSeaLevel, gaugeFromAbsolute, standardPressure } from '../../measure/atmosphere';
import { show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes } from '../findings';
import type { fields } from './schema';

export type Inputs = Values<typeof fields>;

/** Gauges read to 10 or 20 kPa. */
export const FINE = 10;
export const kPa = (pascals: number) => show(pascals, 'kPa', FINE);
export const percent = (share: number) => show(share, '%', 1);

/** Pressure of the air in the shop, Pa; null where neither barometer nor altitude is known. */
export function airOf({ air, altitude }: Inputs): Worked<number | null> {
  if (air !== undefined) return worked(air);
  return altitude === undefined ? worked(null) : standardPressure(altitude);
}

/** All readings of an engine, Pa gauge. */
export interface GaugeReadings {
  dry: number[];
  /** With oil; null where a cylinder was not repeated. */
  wet: (number | null)[];
}

/** Readings as a gauge at sea level would show them; as they are where the air is not known. */
export function gaugeReadings({ cylinders, scale }: Inputs, air: number | null): Worked<GaugeReadings> {
  const found: GaugeReadings = { dry: [], wet: [] };
  for (const [place, { dry, wet }] of cylinders.entries()) {
    const box = (name: string) => {
      const path = `cylinders.${place}.${name}`;
      return { absolute: path, reading: path, ambient: 'air' };
    };
    const one = gaugeOf(dry, scale, air);
    if (!one.ok) return inBoxes(one, box('dry'));
    const repeated = wet === undefined ? worked(null) : gaugeOf(wet, scale, air);
    if (!repeated.ok) return inBoxes(repeated, box('wet'));
    found.dry.push(one.value);
    found.wet.push(repeated.value);
  }
  return worked(found);
}

function gaugeOf(reading: number, scale: Inputs['scale'], air: number | null): Worked<number> {
  if (air === null)
    return scale === 'gauge'
      ? worked(reading)
      : refused({ field: 'air', message: 'A gauge that shows the air in the open needs the air pressure.' });
  const gauge = scale === 'gauge' ? worked(reading) : gaugeFromAbsolute(reading, air);
  return gauge.ok ? atSeaLevel(gauge.value, air) : gauge;
}
