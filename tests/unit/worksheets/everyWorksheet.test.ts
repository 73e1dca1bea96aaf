import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { pinUnits } from '@/components/worksheets/asked';
import { quantityOf } from '@/domain/measure/convert';
import type { Worked } from '@/domain/measure/worked';
import type { Field } from '@/domain/worksheets/fields';
import { VERDICTS, type Outcome } from '@/domain/worksheets/outcome';
import { readInputs } from '@/domain/worksheets/readInputs';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { boxesOf, nest, ownTexts, rowsFilled } from '@/domain/worksheets/typedIn';
import { workOut } from '@/domain/worksheets/work';
import type { TypedIn, Worksheet } from '@/domain/worksheets/worksheet';

/** What every worksheet keeps, whatever it computes. A new one is in this table by its line in the registry alone. */
const FOLDER = 'src/domain/worksheets';
const CASES = WORKSHEETS.map((worksheet) => [worksheet.name, worksheet] as const);

const worked = (worksheet: Worksheet, typed: TypedIn, units: 'metric' | 'inch' = 'metric'): Worked<Outcome> =>
  workOut(worksheet, nest(worksheet.fields, typed), { units }).outcome;

function outcomeOf(result: Worked<Outcome>): Outcome {
  if (!result.ok) throw new Error(result.problems.map(({ field, message }) => `${field}: ${message}`).join('\n'));
  return result.value;
}

/** Every number and every text anywhere inside. */
function inside(value: unknown): (number | string)[] {
  if (typeof value === 'number' || typeof value === 'string') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(inside) : [];
}

/** A field, a box of one, or a row. */
const exists = ({ fields }: Worksheet, path: string): boolean =>
  Object.entries(fields).some(
    ([name, field]) =>
      path === name ||
      (field.type === 'rows'
        ? [...boxesOf(name, field, field.most), ...Array.from({ length: field.most }, (_, i) => `${name}.${i}`)]
        : boxesOf(name, field, 0)
      ).includes(path),
  );

function expectSound(worksheet: Worksheet, result: Worked<Outcome>, what: string): void {
  const said = inside(result);
  for (const one of said) {
    if (typeof one === 'number') expect(Number.isFinite(one), `${what}: a number that is none`).toBe(true);
    // What was typed may be quoted as it was.
    else expect(one.replace(/"[^"]*"/g, ''), what).not.toMatch(/NaN|Infinity|undefined|\[object/);
  }
  if (result.ok) return;
  expect(result.problems.length, what).toBeGreaterThan(0);
  for (const { field, message } of result.problems) {
    expect(exists(worksheet, field), `${what}: "${field}" is no box. ${message}`).toBe(true);
    expect(message, what).toMatch(/^\S.*\.$/s);
  }
}

/** What people and programs put into boxes, as texts and as numbers. */
const nonsense = (field: Field | { type: 'end'; unit: string }): (string | number)[] => {
  const wrongUnit = 'unit' in field && quantityOf(field.unit as never) === 'pressure' ? '5 mm' : '5 kPa';
  const texts = [
    'NaN',
    '∞',
    '0',
    '-1',
    '−1',
    '1e308',
    '1e-308',
    'abc',
    '',
    wrongUnit,
    '1,250',
    '1/0',
    '<b>',
    '9'.repeat(60),
  ];
  return [...texts, NaN, Infinity, -Infinity, 0, -0, -1, 1e308, -1e308, 5e-324];
};

/** The inputs with something else in one box, however it is nested. */
function put(inputs: unknown, [first, ...rest]: string[], value: unknown): unknown {
  if (first === undefined) return value;
  const copy = (Array.isArray(inputs) ? [...(inputs as unknown[])] : { ...(inputs as object) }) as Record<
    string,
    unknown
  >;
  copy[first] = put(copy[first] ?? {}, rest, value);
  return copy;
}

it('has a folder for each line of the registry, and a line for each folder', () => {
  const folders = readdirSync(FOLDER, { withFileTypes: true }).flatMap((one) => (one.isDirectory() ? [one.name] : []));
  expect(WORKSHEETS.map(({ name }) => name).sort()).toEqual(folders.sort());
  for (const one of ['name', 'title', 'summary'] as const)
    expect(new Set(WORKSHEETS.map((worksheet) => worksheet[one])).size, one).toBe(WORKSHEETS.length);
});

describe.each(CASES)('%s', (name, worksheet) => {
  const { fields, groups, example, title, summary } = worksheet;

  it('is called what an address and a sheet can carry, and says what it answers in a sentence', () => {
    expect(name).toMatch(/^[a-z]+(-[a-z]+)*$/);
    expect(title).toMatch(/^[A-Z][^.]+$/);
    expect(summary).toMatch(/^[A-Z].+\.$/);
  });

  it('has words around it that say where it comes from', () => {
    const file = `${FOLDER}/${name}/docs.mdx`;
    expect(existsSync(file), file).toBe(true);
    const words = readFileSync(file, 'utf8');
    expect(words).toMatch(/^## Where this comes from$/m);
    expect(words.split('## Where this comes from')[1]?.trim().length).toBeGreaterThan(40);
  });

  it('asks for each field in exactly one group', () => {
    expect(groups.flatMap((group) => [...group.fields]).sort()).toEqual(Object.keys(fields).sort());
    for (const group of groups) expect(group.title).toMatch(/^[A-Z]/);
  });

  it('names other fields only where there are such', () => {
    const quantities = Object.values(fields).flatMap((field) =>
      field.type === 'rows' ? Object.values(field.columns) : [field],
    );
    for (const field of quantities) {
      if (field.type === 'quantity' && field.density) expect(fields[field.density]?.type).toBe('number');
      if (field.type === 'band' && field.nominal) expect(fields[field.nominal]?.type).toBe('quantity');
    }
  });

  it('works its example out, in metric units and in inches alike', () => {
    expect(ownTexts(fields, Object.entries(example)), 'texts of its own boxes').toEqual(example);
    const metric = outcomeOf(worked(worksheet, example));
    const inch = outcomeOf(worked(worksheet, pinUnits(fields, example, 'metric', 'inch'), 'inch'));
    expect(inch).toEqual(metric);
    expectSound(worksheet, worked(worksheet, example), 'the example');
  });

  it('answers its example in full: reasons in both unit systems, results with their own keys', () => {
    const { verdict, reasons, results } = outcomeOf(worked(worksheet, example));
    expect(VERDICTS).toContain(verdict);
    expect(reasons.length).toBeGreaterThan(0);
    for (const { metric, inch } of reasons) for (const text of [metric, inch]) expect(text).toMatch(/^\S.*\.$/s);
    expect(results.length).toBeGreaterThan(0);
    expect(new Set(results.map(({ key }) => key)).size).toBe(results.length);
    for (const { label, text, value, unit } of results) {
      expect(label).not.toBe('');
      expect(text.metric && text.inch).not.toBe('');
      if (value === null) expect(unit).toBeNull();
    }
  });

  it('asks for what is missing where nothing is filled in', () => {
    const result = worked(worksheet, {});
    expect(result.ok).toBe(false);
    expectSound(worksheet, result, 'nothing filled in');
  });

  it('answers nonsense in any box with a refusal that names it, or soundly', () => {
    const good = nest(fields, example);
    for (const [field, described] of Object.entries(fields)) {
      const rows = described.type === 'rows' ? Math.max(1, rowsFilled(field, described, example)) : 0;
      for (const path of boxesOf(field, described, rows)) {
        const column = described.type === 'rows' ? described.columns[path.split('.')[2] ?? ''] : described;
        for (const bad of nonsense(column ?? described))
          for (const units of ['metric', 'inch'] as const) {
            const what = `${path} = ${JSON.stringify(bad)} (${typeof bad}), ${units}`;
            const inputs = put(good, path.split('.'), bad) as Record<string, unknown>;
            expectSound(worksheet, workOut(worksheet, inputs, { units }).outcome, what);
          }
      }
    }
  });

  it('answers nonsense in all boxes at once', () => {
    const paths = Object.entries(fields).flatMap(([field, one]) =>
      boxesOf(field, one, one.type === 'rows' ? one.most : 0),
    );
    for (const bad of ['NaN', '0', '-1', '1e308', '1e-308', '1'])
      expectSound(worksheet, worked(worksheet, Object.fromEntries(paths.map((path) => [path, bad]))), `all ${bad}`);
  });

  it('takes rows that are too many, too few, or no rows', () => {
    const good = nest(fields, example);
    for (const [field, described] of Object.entries(fields)) {
      if (described.type !== 'rows') continue;
      const first = (good[field] as unknown[])[0];
      for (const rows of [
        [],
        [first],
        Array.from({ length: 500 }, () => first),
        'rows',
        null,
        [null, first],
        [first, {}, first],
      ])
        expectSound(
          worksheet,
          workOut(worksheet, { ...good, [field]: rows }).outcome,
          `${field} = ${JSON.stringify(rows)?.slice(0, 60)}`,
        );
    }
  });

  it('works its example out in less than a millisecond', () => {
    const { inputs } = readInputs(fields, nest(fields, example));
    if (!inputs.ok) throw new Error('The example cannot be read.');
    const mean = () => {
      const from = performance.now();
      for (let i = 0; i < 200; i++) worksheet.compute(inputs.value);
      return (performance.now() - from) / 200;
    };
    // The best of a few: other work on the machine is none of the worksheet's.
    expect(Math.min(...Array.from({ length: 5 }, mean))).toBeLessThan(1);
  });
});
