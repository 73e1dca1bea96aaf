import type { Field, Fields } from './fields';
import type { RawInputs } from './readInputs';
import type { TypedIn } from './worksheet';

/** Between the flat texts of a form or an address and the nested inputs of a worksheet. */

/** All boxes of a field by their paths, a row's for the given number of rows. */
export function boxesOf(name: string, field: Field, rowCount: number): string[] {
  if (field.type === 'band') return [`${name}.min`, `${name}.max`];
  if (field.type !== 'rows') return [name];
  return Array.from({ length: rowCount }, (_, i) =>
    Object.keys(field.columns).map((column) => `${name}.${i}.${column}`),
  ).flat();
}

/** A row's place as `boxesOf` writes it: "7", never "07". */
const isPlace = (text: string | undefined): boolean => /^(0|[1-9]\d{0,2})$/.test(text ?? '');

/** Rows that the texts reach to: one more than the highest place that holds something, at most the field's own most. */
export function rowsFilled(name: string, field: Extract<Field, { type: 'rows' }>, typed: TypedIn): number {
  const places = Object.entries(typed).flatMap(([path, value]) => {
    const [of, place, column] = path.split('.');
    const counts = of === name && isPlace(place) && Object.hasOwn(field.columns, column ?? '') && value.trim() !== '';
    return counts ? [Number(place) + 1] : [];
  });
  return Math.min(Math.max(0, ...places), field.most);
}

/** The nested inputs that flat texts stand for. Texts under unknown paths are left out. */
export function nest(fields: Fields, typed: TypedIn): RawInputs {
  return Object.fromEntries(
    Object.entries(fields).map(([name, field]) => {
      const at = (path: string) => (Object.hasOwn(typed, path) ? typed[path] : undefined);
      if (field.type === 'band') return [name, { min: at(`${name}.min`), max: at(`${name}.max`) }];
      if (field.type !== 'rows') return [name, at(name)];
      return [
        name,
        Array.from({ length: rowsFilled(name, field, typed) }, (_, i) =>
          Object.fromEntries(Object.keys(field.columns).map((column) => [column, at(`${name}.${i}.${column}`)])),
        ),
      ];
    }),
  );
}

/** Only the texts that belong to a worksheet's boxes: an address may carry anything. Each cut at 60 characters. */
export function ownTexts(fields: Fields, texts: Iterable<readonly [string, string]>): TypedIn {
  const kept: Record<string, string> = {};
  for (const [path, value] of texts) {
    const [name = '', second, third, ...more] = path.split('.');
    const field = Object.hasOwn(fields, name) ? fields[name] : undefined;
    if (!field || more.length > 0) continue;
    const fits =
      field.type === 'band'
        ? (second === 'min' || second === 'max') && third === undefined
        : field.type === 'rows'
          ? isPlace(second) && Number(second) < field.most && third !== undefined && Object.hasOwn(field.columns, third)
          : second === undefined;
    if (fits && value.trim() !== '') kept[path] = value.slice(0, 60);
  }
  return kept;
}
