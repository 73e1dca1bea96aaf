import { describe, expect, it } from 'vitest';
import { zodToJsonSchema } from 'zod-to-json-schema';
import type { Fields } from '@/domain/worksheets/fields';
import { inputSchema } from '@/domain/worksheets/inputSchema';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { describeWorksheet } from '@/server/measure/worksheets';
import { schemaProblems } from '../../factories/jsonSchema';
import { FILLED, SAMPLE } from '../../factories/sampleWorksheet';

const schemaOf = (fields: Fields) =>
  zodToJsonSchema(inputSchema(fields), { target: 'jsonSchema2019-09', $refStrategy: 'none' }) as Record<
    string,
    unknown
  >;

/** What both say of a body: the schema that the route checks with, and the JSON Schema that a caller is given. */
function both(body: unknown) {
  const parsed = inputSchema(SAMPLE).safeParse(body);
  const zod = parsed.success ? [] : parsed.error.issues.map(({ path }) => path.join('.'));
  const json = schemaProblems(schemaOf(SAMPLE), body);
  expect(json.length > 0, JSON.stringify({ zod, json })).toBe(zod.length > 0);
  return zod;
}

describe('the inputs as the API takes them', () => {
  it('may be numbers or texts, and leave out what has an answer of its own', () => {
    expect(both(FILLED)).toEqual([]);
    expect(both({ ...FILLED, depth: 12, limit: { min: null, max: 0.05 }, heat: null, side: null, note: null })).toEqual(
      [],
    );
    expect(both({ ...FILLED, injectors: [{ before: 250, after: '255', spray: 'good', leak: 'none' }] })).toEqual([]);
    // Whether there are enough rows is said where it can be said in words, with the box to fill in.
    expect(both({ ...FILLED, injectors: [] })).toEqual([]);
  });

  it.each(Object.keys(FILLED))('lack something without %s', (name) => {
    const { [name]: _, ...rest } = FILLED as Record<string, unknown>;
    expect(both(rest)).toEqual([name]);
  });

  it.each<[string, Record<string, unknown>, string]>([
    ['a misspelt field', { dept: '12' }, ''],
    ['a misspelt end of a limit', { limit: { min: 1, maximum: 2 } }, 'limit'],
    ['a misspelt column', { injectors: [{ before: 1, spary: 'good' }] }, 'injectors.0'],
    ['a list for a measure', { depth: [12] }, 'depth'],
    ['true for a measure', { depth: true }, 'depth'],
    ['nothing for a measure that must be there', { depth: null }, 'depth'],
    ['a text too long to be a measure', { depth: '1'.repeat(61) }, 'depth'],
    ['a choice there is not', { side: 'up' }, 'side'],
    ['a text too long for its field', { engine: 'x'.repeat(13) }, 'engine'],
    ['a measure for a limit', { limit: 12 }, 'limit'],
    ['one row for rows', { injectors: { before: 1 } }, 'injectors'],
    ['too many rows', { injectors: Array.from({ length: 7 }, () => ({ before: 1 })) }, 'injectors'],
    ['a row without its reading', { injectors: [{ after: 1 }] }, 'injectors.0.before'],
  ])('cannot be %s', (_, changed, path) => {
    expect(both({ ...FILLED, ...changed })).toEqual([path]);
  });

  it('say of each box what it is, its unit and its bounds', () => {
    const { properties } = schemaOf(SAMPLE) as { properties: Record<string, { description?: string }> };
    expect(properties['depth']?.description).toBe(
      'Depth read. A number is in mm; a text may name any unit of length. In mm: more than 0, 500 or less.',
    );
    expect(properties['deviation']?.description).toContain('Usually 3 % (common practice, a setting of the shop).');
    expect(properties['factor']?.description).toContain('Usually 0.2.');
    expect(properties['side']?.description).toBe('Side. left: Left; right: Right.');
    for (const [name, { description }] of Object.entries(properties)) expect(description, name).toBeTruthy();
  });
});

describe.each(WORKSHEETS.map((worksheet) => [worksheet.name, worksheet] as const))('%s', (name, { fields }) => {
  const { inputs, example } = describeWorksheet(name) as Record<'inputs' | 'example', Record<string, unknown>>;

  it('takes its own example', () => {
    expect(schemaProblems(inputs, example)).toEqual([]);
    expect(inputSchema(fields).safeParse(example)).toMatchObject({ success: true });
  });

  it('tells a misspelt name, at the top and inside', () => {
    const misspelt = Object.keys(fields).map((field) => ({ ...example, [`${field}x`]: 1 }));
    for (const body of misspelt) expect(schemaProblems(inputs, body)).not.toEqual([]);
    for (const [field, { type }] of Object.entries(fields)) {
      const inside = type === 'band' ? { minn: 1 } : type === 'rows' ? [{ colum: 1 }] : undefined;
      if (inside) expect(schemaProblems(inputs, { ...example, [field]: inside }), field).not.toEqual([]);
    }
  });

  it('describes every box in words', () => {
    const { properties } = inputs as { properties: Record<string, { description?: string }> };
    expect(Object.keys(properties)).toEqual(Object.keys(fields));
    for (const { description } of Object.values(properties)) expect(description).toMatch(/\.$/);
  });
});
