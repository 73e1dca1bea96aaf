import type { BothUnits } from '@/domain/measure/format';
import type { Fields } from '@/domain/worksheets/fields';
import type { TypedIn } from '@/domain/worksheets/worksheet';

/** A limit of a sheet that judges a field, as the sheet's HTML carries it. */
export interface BoundLimit {
  field: string;
  name: string;
  min?: number;
  max?: number;
  nominal?: number;
  unit: string;
  /** The whole limit as the sheet prints it. */
  text: BothUnits;
}

/** The limits of a sheet by the field that they judge: one, or several to choose from (a sheet for two engines). */
export function byField(limits: readonly BoundLimit[]): Map<string, BoundLimit[]> {
  const fields = new Map<string, BoundLimit[]>();
  for (const limit of limits) fields.set(limit.field, [...(fields.get(limit.field) ?? []), limit]);
  return fields;
}

const typed = (value: number | undefined, unit: string): [string] | [] =>
  value === undefined ? [] : [`${value} ${unit}`];

/** What the chosen limits put into the boxes: the ends of the band, and the nominal value where the field has a place for it. */
export function filledBy(fields: Fields, chosen: readonly BoundLimit[]): TypedIn {
  const filled: Record<string, string> = {};
  for (const { field: name, min, max, nominal, unit } of chosen) {
    const field = fields[name];
    if (field?.type !== 'band') continue;
    for (const text of typed(min, unit)) filled[`${name}.min`] = text;
    for (const text of typed(max, unit)) filled[`${name}.max`] = text;
    if (field.nominal) for (const text of typed(nominal, unit)) filled[field.nominal] = text;
  }
  return filled;
}
