import { describe, expect, it } from 'vitest';
import { bandIfKnown, number, quantity } from '@/domain/worksheets/fields';
import { boxUnit, readInputs, type RawInputs, type Reading } from '@/domain/worksheets/readInputs';
import { FILLED, SAMPLE } from '../../factories/sampleWorksheet';

const read = (changed: RawInputs = {}, reading?: Reading) => readInputs(SAMPLE, { ...FILLED, ...changed }, reading);

function valuesOf(changed: RawInputs = {}, reading?: Reading) {
  const { inputs } = read(changed, reading);
  if (!inputs.ok) throw new Error(JSON.stringify(inputs.problems));
  return inputs.value;
}
const problemsOf = (changed: RawInputs = {}, reading?: Reading) => {
  const { inputs } = read(changed, reading);
  return inputs.ok ? [] : inputs.problems;
};
/** The one problem that there must be. */
const problemOf = (changed: RawInputs, reading?: Reading) => {
  const problems = problemsOf(changed, reading);
  expect(problems).toHaveLength(1);
  return [problems[0]?.field, problems[0]?.message];
};

const CC = 1e-6 / 60;
const INCH = 0.0254;

describe('a filled-in worksheet', () => {
  it('is read into base units, with what is usual for what was left empty', () => {
    expect(valuesOf()).toEqual({
      depth: 0.012,
      heat: undefined,
      deviation: 3,
      gap: 0.05e-3,
      flow: undefined,
      density: undefined,
      cylinders: 4,
      factor: 0.2,
      side: 'right',
      stroke: 'two',
      fuel: undefined,
      engine: 'T18F',
      note: undefined,
      limit: { min: expect.closeTo(0.02e-3, 15) as number, max: expect.closeTo(0.05e-3, 15) as number },
      warmth: undefined,
      injectors: [
        { before: expect.closeTo(250 * CC, 15) as number, after: undefined, spray: undefined, leak: 'none' },
        { before: expect.closeTo(252 * CC, 15) as number, after: undefined, spray: undefined, leak: 'none' },
      ],
    });
  });

  it('says what is missing, box by box, where nothing is filled in', () => {
    const { inputs } = readInputs(SAMPLE, {});
    expect(inputs.ok ? [] : inputs.problems.map(({ field, message }) => `${field}: ${message}`).sort()).toEqual([
      'cylinders: Cylinders is missing.',
      'depth: Depth read is missing.',
      'engine: Engine is missing.',
      'injectors.0.before: Injectors: fill in at least 2.',
      'limit.min: Clearance: give the least, the most, or both.',
    ]);
  });

  it.each([undefined, null, '', '   ', '\u202f'])('takes %j for an empty box', (blank) => {
    expect(problemOf({ depth: blank })).toEqual(['depth', 'Depth read is missing.']);
    expect(valuesOf({ heat: blank, note: blank, fuel: blank })).toMatchObject({ heat: undefined, note: undefined });
    expect(valuesOf({ side: blank, deviation: blank })).toMatchObject({ side: 'right', deviation: 3 });
  });
});

describe('a measure', () => {
  it('in a number is in the unit of the field, whatever units the reader has', () => {
    expect(valuesOf({ depth: 25.4 }, { units: 'inch' }).depth).toBeCloseTo(INCH, 12);
    expect(valuesOf({ depth: 25.4 }).depth).toBeCloseTo(INCH, 12);
  });

  it('in a bare text is in the unit of the box', () => {
    expect(valuesOf({ depth: '1' }).depth).toBeCloseTo(0.001, 12);
    expect(valuesOf({ depth: '1' }, { units: 'inch' }).depth).toBeCloseTo(INCH, 12);
    expect(boxUnit('mm', 'inch')).toBe('in');
    expect(boxUnit('N·m', 'inch')).toBe('lbf·ft');
    expect(boxUnit('cc/min', 'inch')).toBe('cc/min');
  });

  it('with its unit means the same to both readers', () => {
    for (const units of ['metric', 'inch'] as const)
      expect(valuesOf({ depth: '14 thou' }, { units }).depth).toBeCloseTo(0.014 * INCH, 12);
  });

  it('tells how it was read, also while another box cannot be', () => {
    const { inputs, understood } = read({ depth: '14 thou', heat: '180 °F', cylinders: 'four' });
    expect(inputs.ok).toBe(false);
    expect(understood['depth']).toEqual({ metric: '0.356 mm', inch: '14 thou' });
    expect(understood['heat']).toEqual({ metric: '82 °C', inch: '180 °F' });
    expect(understood['injectors.1.before']).toEqual({ metric: '252 cc/min', inch: '252 cc/min' });
    expect(understood['limit.max']).toEqual({ metric: '0.05 mm', inch: '0.002 in' });
    expect(understood).not.toHaveProperty('cylinders');
  });

  it.each<[unknown, string]>([
    [0, 'Depth read must be more than zero.'],
    ['-1 mm', 'Depth read must be more than zero.'],
    ['501', 'Depth read must be 500 mm or less.'],
    ['20 in', 'Depth read must be 500 mm or less.'],
    [NaN, 'Depth read: "" is no number. Write, for example, 0.35 mm or 14 thou.'],
    [Infinity, 'Depth read: "" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['1,250', 'Depth read: "1,250" can be read in two ways. Write 1250 or 1.250.'],
    ['12 psi', 'Depth read: psi measures pressure, and here goes length, for example in mm.'],
    [true, 'Depth read: "true" is no number. Write, for example, 0.35 mm or 14 thou.'],
    [{}, 'Depth read: "[object Object]" is no number. Write, for example, 0.35 mm or 14 thou.'],
  ])('that cannot be is refused with its path: %j', (depth, message) => {
    expect(problemOf({ depth })).toEqual(['depth', message]);
  });

  it('is judged by its bounds in the unit they are written in, without a slip at the bound itself', () => {
    expect(problemOf({ heat: '-41 °C' })).toEqual(['heat', 'Oil temperature must be −40 °C or more.']);
    expect(valuesOf({ heat: '-40 °F' }).heat).toBeCloseTo(233.15, 9);
    expect(valuesOf({ heat: '392 °F' }).heat).toBeCloseTo(473.15, 9);
    expect(problemOf({ heat: '393 °F' })).toEqual(['heat', 'Oil temperature must be 200 °C or less.']);
    expect(valuesOf({ depth: '500' }).depth).toBeCloseTo(0.5, 12);
    expect(problemOf({ deviation: -0.1 })).toEqual(['deviation', 'Deviation allowed cannot be less than zero.']);
  });
});

describe('a flow', () => {
  it('in lb/h needs the density, and takes it from the field that holds it, wherever that stands', () => {
    expect(problemOf({ flow: '30 lb/h' })).toEqual([
      'flow',
      'Nominal flow: lb/h to cc/min needs the density of the fluid, because one is a volume and the other a mass.',
    ]);
    // 30 lb/h is 13.607 771 1 kg/h; of 745 kg/m³ that is 304.4 cc/min.
    const { flow } = valuesOf({ flow: '30 lb/h', density: '745' });
    expect(flow).toBeCloseTo((30 * 0.45359237) / 3600 / 745, 15);
    const injectors = [{ before: '30 lb/h' }, { before: '3.78 g/s', after: '305' }];
    expect(valuesOf({ injectors, density: 745 }).injectors).toMatchObject([
      { before: expect.closeTo((30 * 0.45359237) / 3600 / 745, 15) as number },
      { before: expect.closeTo(0.00378 / 745, 15) as number, after: expect.closeTo(305 * CC, 15) as number },
    ]);
    expect(read({ flow: '30 lb/h', density: 745 }).understood['flow']).toEqual({
      metric: '304.4 cc/min',
      inch: '30 lb/h',
    });
  });

  it('is refused with the density where that cannot be', () => {
    expect(problemsOf({ flow: '30 lb/h', density: '0' }).map(({ field }) => field)).toEqual(['density', 'flow']);
  });

  it('uses the usual density where the field has one', () => {
    const fields = {
      flow: quantity('cc/min', { label: 'Flow', density: 'density' }),
      density: number({ label: 'Density', usual: 750 }),
    };
    const { inputs } = readInputs(fields, { flow: '7.5 g/s' }, { rules: {} });
    expect(inputs).toMatchObject({ ok: true, value: { flow: expect.closeTo(600 * CC, 12) as number } });
    const byShop = readInputs(fields, { flow: '7.5 g/s' }, { rules: { density: 1000 } });
    expect(byShop.inputs).toMatchObject({ value: { flow: expect.closeTo(450 * CC, 12) as number, density: 1000 } });
  });
});

describe('a number', () => {
  it.each<[unknown, number]>([
    ['4', 4],
    [' 4 ', 4],
    [8, 8],
    ['1e1', 10],
    ['12.0', 12],
  ])('%j is read', (cylinders, value) => expect(valuesOf({ cylinders }).cylinders).toBe(value));

  it.each<[unknown, number]>([
    ['0,745', 0.745],
    ['25\u202f000', 25_000],
    ['745 kg/m³', 745],
    ['745kg/m³', 745],
  ])('%j is a density', (density, value) => expect(valuesOf({ density }).density).toBe(value));

  it.each<[string, unknown, string]>([
    ['cylinders', '4.5', 'Cylinders must be a whole number.'],
    ['cylinders', '0', 'Cylinders must be 1 or more.'],
    ['cylinders', '17', 'Cylinders must be 16 or less.'],
    ['cylinders', 'four', 'Cylinders: "four" is no number. Write, for example, 12.'],
    ['cylinders', '4 mm', 'Cylinders: Write the number alone, without a unit.'],
    ['cylinders', Infinity, 'Cylinders must be a number.'],
    ['cylinders', NaN, 'Cylinders must be a number.'],
    ['cylinders', '1e400', 'Cylinders must be a number.'],
    ['density', '1,000', 'Density: "1,000" can be read in two ways. Write 1000 or 1.000.'],
    ['density', '30000', 'Density must be 25\u202f000 or less.'],
    ['density', 0, 'Density must be more than zero.'],
  ])('%s %j is refused in words', (name, raw, message) => {
    expect(problemOf({ [name]: raw })).toEqual([name, message]);
  });
});

describe('a rule of thumb', () => {
  it('is what the reader says, else what the shop has set, else what is usual', () => {
    const rules = { deviation: 5, gap: 0.08, factor: 0.15 };
    expect(valuesOf({}, { rules })).toMatchObject({ deviation: 5, gap: expect.closeTo(0.08e-3, 12), factor: 0.15 });
    expect(valuesOf({ deviation: '4', gap: '2 thou', factor: '0.3' }, { rules })).toMatchObject({
      deviation: 4,
      gap: expect.closeTo(2e-3 * INCH, 12),
      factor: 0.3,
    });
    expect(valuesOf({}, { rules: { gap: 0.08 } })).toMatchObject({ deviation: 3, factor: 0.2 });
  });

  it('is in the unit of the field, for a reader in inch units too', () => {
    expect(valuesOf({}, { rules: { gap: 0.08 }, units: 'inch' }).gap).toBeCloseTo(0.08e-3, 12);
    expect(valuesOf({}, { units: 'inch' }).gap).toBeCloseTo(0.05e-3, 12);
  });
});

describe('a choice and a text', () => {
  it('are taken as they are', () => {
    expect(valuesOf({ side: 'left', fuel: 'petrol', engine: '  T24D ', note: 'x'.repeat(12) })).toMatchObject({
      side: 'left',
      fuel: 'petrol',
      engine: 'T24D',
      note: 'x'.repeat(12),
    });
  });

  it.each<[string, unknown, string]>([
    ['side', 'Left', 'Side must be one of left, right.'],
    ['side', 'constructor', 'Side must be one of left, right.'],
    ['fuel', 7, 'Fuel must be one of petrol.'],
    ['engine', 'x'.repeat(13), 'Engine must be 12 characters or fewer.'],
  ])('%s %j is refused in words', (name, raw, message) => {
    expect(problemOf({ [name]: raw })).toEqual([name, message]);
  });
});

describe('a limit', () => {
  it('may be open at either end', () => {
    expect(valuesOf({ limit: { min: '1' } }).limit).toEqual({ min: 0.001 });
    expect(valuesOf({ limit: { max: '1', min: ' ' } }).limit).toEqual({ max: 0.001 });
    expect(valuesOf({ warmth: { min: '20', max: '104 °F' } }).warmth).toEqual({
      min: 293.15,
      max: expect.closeTo(313.15, 9) as number,
    });
    expect(valuesOf({ warmth: {} }).warmth).toBeUndefined();
  });

  it('has its ends the right way round, and each end for its own path', () => {
    expect(problemOf({ limit: { min: '0.06', max: '0.05' } })).toEqual([
      'limit.max',
      'Clearance: the most is less than the least.',
    ]);
    expect(problemOf({ limit: { min: 'x', max: '0.05' } })[0]).toBe('limit.min');
    expect(problemOf({ limit: { min: '0.02', max: '5 psi' } })).toEqual([
      'limit.max',
      'Clearance, most: psi measures pressure, and here goes length, for example in mm.',
    ]);
    expect(problemOf({ limit: {} })[0]).toBe('limit.min');
    expect(problemOf({ limit: 'all of it' })[0]).toBe('limit.min');
  });

  it('that is the same at both ends stands, whichever units the two are written in', () => {
    for (const [min, max] of [
      ['0.03048 mm', '0.0012 in'],
      ['0.003 in', '0.0762 mm'],
      ['1', '1'],
    ]) {
      const { limit } = valuesOf({ limit: { min, max } });
      expect(limit.max! >= limit.min!).toBe(true);
    }
    // The first pair is the one that goes wrong without forgiveness.
    expect(0.03048 * 1e-3).toBeGreaterThan(0.0012 * INCH);
  });

  it('may be left out where it is not needed', () => {
    const fields = { limit: bandIfKnown('mm', { label: 'Limit' }) };
    expect(readInputs(fields, {}).inputs).toEqual({ ok: true, value: { limit: undefined } });
  });
});

describe('rows', () => {
  const before = (...texts: string[]) => texts.map((text) => ({ before: text, leak: 'none' }));

  it('left empty at the end do not count, with their choices', () => {
    const values = valuesOf({ injectors: [...before('250', '252', '', ' '), {}, null] });
    expect(values.injectors).toHaveLength(2);
  });

  it('left empty in the middle are a reading that is missing; those after it keep their number', () => {
    expect(problemOf({ injectors: before('250', '', '252') })).toEqual([
      'injectors.1.before',
      'Injector 2, before cleaning is missing.',
    ]);
    expect(problemOf({ injectors: before('250', '252', 'x') })[1]).toMatch(/^Injector 3, before cleaning: "x"/);
  });

  it('must be enough and not too many', () => {
    expect(problemOf({ injectors: before('250') })).toEqual(['injectors.1.before', 'Injectors: fill in at least 2.']);
    expect(problemOf({ injectors: before('1', '2', '3', '4', '5', '6', '7') })).toEqual([
      'injectors',
      'Injectors: 6 at most.',
    ]);
    for (const none of [undefined, null, 'rows', 7, { 0: { before: '1' } }])
      expect(problemOf({ injectors: none })).toEqual(['injectors.0.before', 'Injectors: fill in at least 2.']);
    expect(problemsOf({ injectors: before(...Array.from({ length: 5000 }, () => 'x')) })).toHaveLength(7);
  });

  it('are read cell by cell', () => {
    const injectors = [
      { before: '250', after: '255', spray: 'good' },
      { before: '251 mL/min', leak: 'none' },
    ];
    expect(valuesOf({ injectors }).injectors).toMatchObject([{ spray: 'good' }, { leak: 'none', after: undefined }]);
    expect(problemOf({ injectors: [...injectors, { before: '250', spray: 'bad' }] })).toEqual([
      'injectors.2.spray',
      'Injector 3, spray must be one of good.',
    ]);
    expect(problemsOf({ injectors: ['x', 7] }).length).toBeGreaterThan(0);
  });
});
