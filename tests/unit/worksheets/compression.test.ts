import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

const cylinders = (dry: string[], wet: Record<number, string> = {}) =>
  Object.fromEntries([
    ...dry.map((value, i) => [`cylinders.${i}.dry`, value]),
    ...Object.entries(wet).map(([i, value]) => [`cylinders.${i}.wet`, value]),
  ]) as Record<string, string>;
const answer = (dry: string[], more: Record<string, string> = {}) =>
  answerOf('compression', { ...cylinders(dry), ...more });
const limits = { 'compression.min': '1050', 'share.min': '75' };

describe('compression by its limits', () => {
  it.each([
    [['1300', '1290', '1280'], 'pass', 'The lowest reads 1280 kPa; the least allowed is 1050 kPa.'],
    [['1300', '1290', '930'], 'fail', 'Cylinder 3 reads 930 kPa, too little: the least allowed is 1050 kPa.'],
    // To 10 kPa, 1046 and 1050 would read alike.
    [['1300', '1290', '1046'], 'fail', 'Cylinder 3 reads 1046 kPa, too little: the least allowed is 1050 kPa.'],
    [['1500', '1490', '1080'], 'fail', 'Lowest against highest is 72 %, too little: the least allowed is 75 %.'],
  ])('%j: %s', (dry, verdict, first) => {
    const made = answer(dry, limits);
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toBe(first);
  });

  it('lets a rule of thumb be, where the sheet says how near the cylinders must lie', () => {
    expect(answer(['1300', '1150'], { ...limits, rule: 'difference' }).verdict).toBe('pass');
  });

  it('reads a single cylinder alone', () => {
    const made = answer(['1200']);
    expect(made.verdict).toBe('none');
    expect(reasonsOf(made)).toEqual(['The cylinder reads 1200 kPa; no limit was given.']);
    expect(textOf(made, 'share')).toBeUndefined();
  });

  it('draws dry and wet side by side, from the least up', () => {
    const made = answerOf('compression', { ...cylinders(['1300', '900'], { 1: '1150' }), ...limits, nominal: '1300' });
    expect(made.charts).toMatchObject([
      {
        kind: 'bars',
        from: 'least',
        nominal: 1_300_000,
        band: { min: 1_050_000 },
        series: [
          { label: 'Dry', values: [1_300_000, 900_000] },
          { label: 'With oil', values: [null, 1_150_000] },
        ],
      },
    ]);
  });
});

describe('compression by rules of thumb, which only ask to look again', () => {
  it('S (TM 5-4210-230-14&P-1): the lowest 75 % of the highest or more', () => {
    expect(answer(['160 psi', '120 psi']).verdict).toBe('none');
    const low = answer(['160 psi', '119 psi']);
    expect(low.verdict).toBe('look');
    expect(reasonsOf(low)[0]).toBe('Lowest against highest is 74 %; 75 % or more is usual.');
    expect(low.results[0]).toMatchObject({ key: 'share', verdict: 'look' });
  });

  it('S (TM 1-1500-204-23-1): 20 % below the average', () => {
    const by = { rule: 'average' };
    const low = answer(['150 psi', '150 psi', '150 psi', '110 psi'], by);
    expect(low.verdict).toBe('look');
    expect(reasonsOf(low)).toEqual(['Cylinder 4 lies 21 % below the average; up to 20 % is usual.']);
    expect(reasonsOf(answer(['150 psi', '150 psi', '150 psi', '115 psi'], by))).toEqual([
      'The lowest lies 19 % below the average; up to 20 % is usual.',
    ]);
  });

  it('S (TM 10-3930-618-20): 10 psi between cylinders', () => {
    const by = { rule: 'difference' };
    expect(answer(['150 psi', '140 psi'], by).verdict).toBe('none');
    const apart = answer(['150 psi', '135 psi'], by);
    expect(apart.verdict).toBe('look');
    expect(apart.reasons[0]?.inch).toBe('Highest less lowest is 15 psi; up to 10 psi is usual.');
  });
});

describe('the repeat with oil', () => {
  const said = (dry: string[], oiled: Record<number, string>, more: Record<string, string> = {}) =>
    reasonsOf(answerOf('compression', { ...cylinders(dry, oiled), ...limits, ...more })).filter((one) =>
      /oil|gasket/.test(one),
    );

  it('points at the rings by a clear rise, at a valve or the gasket without one', () => {
    expect(said(['1300', '900', '880'], { 1: '1150', 2: '890' })).toEqual([
      'Cylinder 2 rises by 28 % with oil: the rings leak.',
      'Cylinder 3 rises by 1 % with oil: a valve or the gasket leaks.',
    ]);
    expect(said(['1300', '900'], { 1: '1150' }, { rise: '40' })).toEqual([
      'Cylinder 2 rises by 28 % with oil: a valve or the gasket leaks.',
    ]);
    expect(said(['1300', '0'], { 1: '200' })).toEqual([
      'Cylinder 2 rises from nothing to 200 kPa with oil: the rings leak.',
    ]);
    expect(said(['1300', '900'], { 1: '890' })).toEqual([
      'Cylinder 2 does not rise with oil: a valve or the gasket leaks.',
    ]);
  });

  it('suspects the gasket between two that are low side by side, and says nothing of cylinders that are well', () => {
    const low = ['1300', '700', '690', '1280'];
    const oiled = { 1: '705', 2: '695', 3: '1285' };
    expect(said(low, oiled)).toHaveLength(3);
    expect(said(low, oiled)[2]).toBe(
      'Cylinders 2 and 3 are low side by side and neither rises: suspect the gasket between them.',
    );
    expect(said(low, oiled, { layout: 'other' })).toHaveLength(2);
  });
});

describe('the gauge and the air', () => {
  it('C: 1000 kPa at 1000 m is 1127 kPa at sea level, and is judged there', () => {
    const made = answer(['1000'], { altitude: '1000', 'compression.min': '1050' });
    expect(made.verdict).toBe('pass');
    expect(reasonsOf(made)).toEqual([
      'The lowest reads 1130 kPa; the least allowed is 1050 kPa.',
      'Readings are corrected to sea level from air of 89.9 kPa.',
    ]);
    expect(made.results[0]?.value).toBeCloseTo(1127.4, 1);
    expect(answer(['1000'], { 'compression.min': '1050' }).verdict).toBe('fail');
  });

  it('takes the air off a gauge that counts from vacuum, wet readings as well', () => {
    const absolute = { scale: 'absolute', air: '101.325' };
    const made = answerOf('compression', {
      ...cylinders(['1401.325', '901.325'], { 1: '981.325' }),
      ...limits,
      ...absolute,
    });
    expect(made.charts[0]).toMatchObject({ series: [{ values: [1_300_000, 800_000] }, { values: [null, 880_000] }] });
    expect(reasonsOf(made)).toContain('Cylinder 2 rises by 10 % with oil: the rings leak.');
  });
});

it.each([
  [cylinders(['0', '0']), 'cylinders', 'No cylinder shows any compression; check the gauge first.'],
  [cylinders(['1300', '', '1200']), 'cylinders.1.dry', 'Cylinder 2, dry is missing.'],
  [
    { ...cylinders(['1300']), scale: 'absolute' },
    'air',
    'A gauge that shows the air in the open needs the air pressure.',
  ],
  [
    { ...cylinders(['1300', '90']), scale: 'absolute', air: '100' },
    'cylinders.1.dry',
    'The absolute pressure cannot be less than that of the air.',
  ],
  [
    { ...cylinders(['1300']), 'compression.min': '-1' },
    'compression.min',
    'The least of the compression allowed cannot be less than zero.',
  ],
])('refuses %j', (typed, field, message) => {
  expect(problemsOf('compression', typed)).toEqual([{ field, message }]);
});
