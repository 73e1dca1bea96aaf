import { describe, expect, it } from 'vitest';
import { convert, fromBase, sameKind, type Unit } from '@/domain/measure/convert';
import { inchUnit } from '@/domain/measure/format';
import { readTyped } from '@/domain/measure/read';
import type { Column } from '@/domain/worksheets/fields';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { nest } from '@/domain/worksheets/typedIn';
import { workOut } from '@/domain/worksheets/work';
import type { Worksheet } from '@/domain/worksheets/worksheet';
import { relative } from '../../factories/measures';
import { call } from './support/call';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();

const NAMES = WORKSHEETS.map(({ name }) => name);
const exampleOf = ({ fields, example }: Worksheet) => JSON.parse(JSON.stringify(nest(fields, example))) as Body;
type Body = Record<string, unknown>;

interface Worked {
  verdict: string;
  reasons: string[];
  results: { key: string; value: number | null; text: { metric: string; inch: string } }[];
}

/** The inputs with every measure written anew: `write` is given what the text means in the unit of its field. */
function rewritten({ fields, example }: Worksheet, write: (value: number, unit: Unit) => unknown): Body {
  const anew = (path: string, text: string): unknown => {
    const [name = '', , column = ''] = path.split('.');
    const field = fields[name];
    const described: Column | typeof field = field?.type === 'rows' ? field.columns[column] : field;
    if (described?.type !== 'quantity' && described?.type !== 'band') return text;
    const read = readTyped(text, described.unit);
    // A flow by mass stays as it is written: it has no number in the unit of its field without the density.
    if (!read.ok || !sameKind(read.value.unit, described.unit)) return text;
    return write(fromBase(read.value.base, described.unit), described.unit);
  };
  const paths = nest(fields, Object.fromEntries(Object.keys(example).map((path) => [path, path])));
  return JSON.parse(JSON.stringify(paths), (_, path: unknown) =>
    typeof path === 'string' ? anew(path, example[path] ?? '') : path,
  ) as Body;
}

const inInches = (value: number, unit: Unit): string => {
  const to = inchUnit(unit, 1e9);
  const converted = convert(value, unit, to);
  return converted.ok ? `${converted.value} ${to}` : `${value} ${unit}`;
};

describe('the worksheets', () => {
  it('are listed by name for everybody who is signed in', async () => {
    const { status, body } = await call(who('north.apprentice'), 'GET', '/worksheets');
    expect(status).toBe(200);
    expect(body.items).toEqual(WORKSHEETS.map(({ name, title, summary }) => ({ name, title, summary })));
  });

  it.each(NAMES)('%s says what it takes, and takes the example that it gives', async (name) => {
    const { status, body } = await call(who('steward'), 'GET', `/worksheets/${name}`);
    expect(status).toBe(200);
    expect(body.inputs).toMatchObject({ type: 'object', additionalProperties: false });
    const worked = await call(who('pier.technician'), 'POST', `/worksheets/${name}`, { body: body.example });
    expect(worked.status).toBe(200);
    expect(worked.body.results.length).toBeGreaterThan(0);
    // What only the screen needs stays out of the answer.
    for (const result of worked.body.results) expect(result).not.toHaveProperty('main');
  });

  it.each(NAMES)('%s refuses nonsense in each input with its path', async (name) => {
    const worksheet = WORKSHEETS.find((one) => one.name === name)!;
    for (const [field, { type }] of Object.entries(worksheet.fields)) {
      if (type === 'text') continue;
      const bad = type === 'band' ? { min: 'nonsense' } : 'nonsense';
      const body = { ...exampleOf(worksheet), [field]: bad };
      const answer = await call(who('north.apprentice'), 'POST', `/worksheets/${name}`, { body });
      expect(answer.status, field).toBe(422);
      expect(answer.headers.get('content-type')).toBe('application/problem+json');
      const paths = (answer.body.errors as { path: string }[]).map(({ path }) => path);
      expect(paths, JSON.stringify(answer.body)).toContain(type === 'band' ? `${field}.min` : field);
    }
  });

  it.each(NAMES)('%s refuses a misspelt input, and a body that is no object', async (name) => {
    const example = exampleOf(WORKSHEETS.find((one) => one.name === name)!);
    for (const body of [{ ...example, misspelt: 1 }, [], 'text', 7, null]) {
      const answer = await call(who('north.apprentice'), 'POST', `/worksheets/${name}`, { body });
      expect(answer.status, JSON.stringify(body)).toBe(422);
    }
    const { body } = await call(who('north.apprentice'), 'POST', `/worksheets/${name}`, {
      body: { ...example, misspelt: 1 },
    });
    expect(JSON.stringify(body.errors)).toContain('misspelt');
  });

  it.each(NAMES)('%s takes a text in inch units and a number in metric alike', async (name) => {
    const worksheet = WORKSHEETS.find((one) => one.name === name)!;
    const post = async (body: Body) => {
      const answer = await call(who('north.technician'), 'POST', `/worksheets/${name}`, { body });
      expect(answer.status, JSON.stringify({ body, answer: answer.body })).toBe(200);
      return answer.body as Worked;
    };
    const numbers = await post(rewritten(worksheet, (value) => value));
    const inches = await post(rewritten(worksheet, inInches));
    expect(inches.verdict).toBe(numbers.verdict);
    expect(inches.results.map(({ key }) => key)).toEqual(numbers.results.map(({ key }) => key));
    for (const [i, { key, value }] of inches.results.entries()) {
      const other = numbers.results[i]?.value;
      if (typeof value !== 'number' || typeof other !== 'number') expect(value, key).toBe(other);
      // A difference of two near readings keeps fewer digits than the readings.
      else if (Math.abs(value) > 1e-9) expect(relative(value, other), key).toBeLessThan(1e-6);
    }
  });

  it('give their reasons in the units of whoever asks', async () => {
    const person = who('north.technician');
    await call(person, 'PATCH', '/me', { body: { units: 'inch' } });
    for (const worksheet of WORKSHEETS) {
      const { outcome } = workOut(worksheet, nest(worksheet.fields, worksheet.example));
      if (!outcome.ok) throw new Error(`${worksheet.name} does not work its example out.`);
      for (const [as, units] of [
        [person, 'inch'],
        [who('north.apprentice'), 'metric'],
      ] as const) {
        const { body } = await call(as, 'POST', `/worksheets/${worksheet.name}`, { body: exampleOf(worksheet) });
        expect(body.reasons).toEqual(outcome.value.reasons.map((reason) => reason[units]));
      }
    }
  });

  it('are unknown under other names, and closed to who is signed out', async () => {
    for (const name of ['no-such-sheet', 'constructor', '__proto__', 'Units', 'units%2Fmore']) {
      expect((await call(who('steward'), 'GET', `/worksheets/${name}`)).status, name).toBe(404);
      expect((await call(who('steward'), 'POST', `/worksheets/${name}`, { body: {} })).status, name).toBe(404);
    }
    for (const [method, path] of [
      ['GET', '/worksheets'],
      ['GET', '/worksheets/units'],
      ['POST', '/worksheets/units'],
    ] as const)
      expect((await call(null, method, path, method === 'POST' ? { body: {} } : {})).status).toBe(401);
  });
});

describe('the worksheet of units', () => {
  const work = (measure: string, more: Body = {}) =>
    call(who('north.apprentice'), 'POST', '/worksheets/units', { body: { measure, ...more } });

  it('answers in every unit of the kind', async () => {
    const { body } = await work('89 in-lb');
    // 89 lbf·in is 10.055 650 N·m by the definitions of the pound, the inch and standard gravity; computed here.
    expect(body.results).toContainEqual(
      expect.objectContaining({ key: 'N·m', value: expect.closeTo((89 * 0.45359237 * 9.80665 * 25.4) / 1000, 9) }),
    );
    expect(body).toMatchObject({ verdict: 'none', reasons: ['89 lbf·in, in the other units of torque.'] });
  });

  it('needs the density between a volume and a mass in a time', async () => {
    const keys = (answer: { body: Worked }) => answer.body.results.map(({ key }) => key);
    expect(keys(await work('250 cc/min'))).not.toContain('lb/h');
    expect(keys(await work('250 cc/min', { density: '745 kg/m³' }))).toContain('lb/h');
    expect(await work('250 cc/min', { density: '1,000' })).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'density' }] },
    });
  });
});
