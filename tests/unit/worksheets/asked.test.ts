import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { caseAddress, pinUnits, rowsShown, type Units } from '@/components/worksheets/asked';
import { UNITS_BY_QUANTITY } from '@/domain/measure/quantities';
import type { Unit } from '@/domain/measure/convert';
import { bandIfKnown, quantityIfKnown, type Fields } from '@/domain/worksheets/fields';
import { readInputs } from '@/domain/worksheets/readInputs';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { boxesOf, nest, ownTexts } from '@/domain/worksheets/typedIn';
import type { TypedIn } from '@/domain/worksheets/worksheet';
import { SAMPLE } from '../../factories/sampleWorksheet';

const UNITS: readonly Unit[] = [...Object.values(UNITS_BY_QUANTITY).flat(), 'lb'];
/** A box and a limit for each unit there is. */
const EVERY_UNIT: Fields = Object.fromEntries(
  UNITS.flatMap((unit, i) => [
    [`box${i}`, quantityIfKnown(unit, { label: `Box ${unit}` })],
    [`band${i}`, bandIfKnown(unit, { label: `Limit ${unit}` })],
  ]),
);

/** The same fields with nothing asked for, so that one box can be filled in alone. */
const loose = (fields: Fields): Fields =>
  Object.fromEntries(
    Object.entries(fields).map(([name, field]) => [
      name,
      field.type === 'rows'
        ? { ...field, least: 0, columns: loose(field.columns) as typeof field.columns }
        : { ...field, optional: true },
    ]),
  );
const SETS = [SAMPLE, EVERY_UNIT, ...WORKSHEETS.map(({ fields }) => fields)].map(loose);
const other = (units: Units): Units => (units === 'metric' ? 'inch' : 'metric');

/** What the boxes hold once they are read: measures, or the boxes that cannot be read. */
function meant(fields: Fields, typed: TypedIn, units: Units) {
  const { inputs } = readInputs(fields, nest(fields, typed), { units });
  return inputs.ok ? inputs.value : inputs.problems.map(({ field }) => field);
}

const texts = fc.oneof(
  fc.double({ min: -1000, max: 1000, noNaN: true }).map(String),
  fc.string({ maxLength: 12, unit: fc.constantFrom(...'0123456789.,/-+−– ½¼e"\'mnlbfit°C%'.split('')) }),
  fc.constantFrom(
    '-300',
    '1-3/8',
    '1 3/8',
    '½',
    '3 ⅜',
    '1e3',
    '5.',
    '.5',
    '1,250',
    '1,25',
    "1'250",
    '− 5',
    '+5',
    '1/0',
  ),
  fc.constantFrom('25 mm', '14 thou', '1 3/8 in', '89 in-lb', '180 °F', 'abc', '', '  '),
);

describe('switching the units of the boxes', () => {
  it.each(SETS.map((fields, i) => [i, fields] as const))('never changes what was meant (set %i)', (_, fields) => {
    const paths = Object.entries(fields).flatMap(([name, field]) => boxesOf(name, field, 2));
    fc.assert(
      fc.property(fc.constantFrom(...paths), texts, fc.constantFrom<Units>('metric', 'inch'), (path, text, units) => {
        const typed = { [path]: text };
        const pinned = pinUnits(fields, typed, units, other(units));
        expect(Object.keys(pinned)).toEqual(Object.keys(typed));
        expect(meant(fields, pinned, other(units))).toEqual(meant(fields, typed, units));
        // And back again, and once more to the same units.
        const back = pinUnits(fields, pinned, other(units), units);
        expect(meant(fields, back, units)).toEqual(meant(fields, typed, units));
        expect(pinUnits(fields, typed, units, units)).toBe(typed);
      }),
      { numRuns: 1000 },
    );
  });

  it('writes the unit only where the box changes it and the text has none', () => {
    const typed = { depth: ' 25 ', heat: '80 °C', flow: '250', cylinders: '4', 'limit.min': '1-3/8', engine: '25' };
    expect(pinUnits(SAMPLE, { ...typed, 'injectors.0.before': '250' }, 'metric', 'inch')).toEqual({
      ...typed,
      depth: '25 mm',
      'limit.min': '1-3/8 mm',
      'injectors.0.before': '250',
    });
    expect(pinUnits(SAMPLE, { depth: '1', heat: '-5' }, 'inch', 'metric')).toEqual({ depth: '1 in', heat: '-5 °F' });
  });
});

describe('the address of a case', () => {
  const typed = { depth: '14 thou', 'limit.min': '0,02', 'injectors.1.before': '250', stray: 'x', heat: ' ' };

  it('brings the same boxes and units again, and nothing else', () => {
    const url = new URL(caseAddress('/handbook/calculators/sample', SAMPLE, typed, 'inch'), 'http://book.test');
    expect(url.pathname).toBe('/handbook/calculators/sample');
    expect(url.searchParams.get('units')).toBe('inch');
    expect(ownTexts(SAMPLE, url.searchParams)).toEqual({
      depth: '14 thou',
      'limit.min': '0,02',
      'injectors.1.before': '250',
    });
  });

  it('is the bare path where nothing is filled in', () => {
    expect(caseAddress('/here', SAMPLE, {}, 'inch')).toBe('/here');
    expect(caseAddress('/here', SAMPLE, { depth: ' ', stray: 'x' }, 'metric')).toBe('/here');
  });

  it('has room for every worksheet: no field takes the name that holds the units', () => {
    for (const { name, fields } of WORKSHEETS) expect(Object.keys(fields), name).not.toContain('units');
  });
});

describe('the rows that a list shows', () => {
  it('are what it starts with, or what is filled in', () => {
    expect(rowsShown(SAMPLE, {})).toEqual({ injectors: 4 });
    expect(rowsShown(SAMPLE, { 'injectors.5.before': '1' })).toEqual({ injectors: 6 });
    expect(rowsShown(SAMPLE, { 'injectors.99.before': '1' })).toEqual({ injectors: 6 });
  });
});
