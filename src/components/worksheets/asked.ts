import { readBare } from '@/domain/measure/read';
import type { Fields } from '@/domain/worksheets/fields';
import { boxUnit } from '@/domain/worksheets/readInputs';
import { ownTexts, rowsFilled } from '@/domain/worksheets/typedIn';
import type { TypedIn } from '@/domain/worksheets/worksheet';

export type Units = 'metric' | 'inch';

/** The address of a case: what stands in the boxes, and the units that bare numbers are in. */
export function caseAddress(path: string, fields: Fields, typed: TypedIn, units: Units): string {
  const own = Object.entries(ownTexts(fields, Object.entries(typed)));
  if (own.length === 0) return path;
  return `${path}?${new URLSearchParams([...own, ['units', units]]).toString()}`;
}

/** Unit of each box in the order of the fields, where it has one. */
const unitOfBox = (fields: Fields, path: string) => {
  const [name = '', , column] = path.split('.');
  const field = fields[name];
  if (field?.type === 'rows') {
    const cell = field.columns[column ?? ''];
    return cell?.type === 'quantity' ? cell.unit : null;
  }
  return field?.type === 'quantity' || field?.type === 'band' ? field.unit : null;
};

/**
 * The same texts with a unit after every bare number whose box is about to change its unit: 25 in a millimetre box
 * is still 25 mm once the boxes are in inches.
 */
export function pinUnits(fields: Fields, typed: TypedIn, from: Units, to: Units): TypedIn {
  if (from === to) return typed;
  return Object.fromEntries(
    Object.entries(typed).map(([path, text]) => {
      const unit = unitOfBox(fields, path);
      const changes = unit !== null && boxUnit(unit, from) !== boxUnit(unit, to);
      return [path, changes && readBare(text).ok ? `${text.trim()} ${boxUnit(unit, from)}` : text];
    }),
  );
}

/** Rows that each list shows: what it starts with, or what is filled in. */
export const rowsShown = (fields: Fields, typed: TypedIn): Record<string, number> =>
  Object.fromEntries(
    Object.entries(fields).flatMap(([name, field]) =>
      field.type === 'rows' ? [[name, Math.max(field.start, field.least, rowsFilled(name, field, typed))]] : [],
    ),
  );
