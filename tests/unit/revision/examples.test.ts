import { describe, expect, it } from 'vitest';
import { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure, Step } from '@/domain/procedure/types';
import { actedOn, bodyText } from '@/domain/revision/bodyText';
import { compareProcedures } from '@/domain/revision/compare';

const frontmatter = Frontmatter.parse({
  title: 'Reseal the cover',
  summary: 'Stop it weeping.',
  system: 'sealing',
  engines: ['tarn-t18f'],
  minutes: 70,
  skill: 'apprentice',
  parts: [
    { key: 'gasket', name: 'Cover gasket, moulded', number: 'TN-4102', quantity: 1, action: 'replace' },
    { key: 'bolt', name: 'Cover bolt', quantity: 11, action: 'reuse' },
  ],
  supplies: [{ key: 'silicone', name: 'Silicone', skinOver: 10, cure: 1440 }],
  torques: [
    {
      key: 'bolt',
      name: 'Cover bolt',
      thread: 'M6',
      pitch: 1,
      length: 25,
      class: '8.8',
      condition: 'dry',
      nm: 10,
      tolerance: 1,
      passes: [5],
      count: 11,
      source: 'demo',
    },
    { key: 'coil', name: 'Coil bolt', thread: 'M6', pitch: 1, condition: 'dry', nm: 8, count: 4 },
  ],
  limits: [
    {
      key: 'proud',
      name: 'Gasket proud',
      quantity: 'length',
      unit: 'mm',
      min: 0.8,
      max: 1.4,
      condition: 'cover upside down',
    },
    { key: 'coolant', name: 'Coolant', quantity: 'temperature', unit: '°C', max: 50 },
  ],
  cautions: [
    { key: 'hot', signal: 'WARNING', hazard: 'Hot oil', harm: 'burns skin', avoid: 'Let it cool.' },
    { key: 'dirt', signal: 'NOTICE', hazard: 'Dirt', harm: 'wears the cams', avoid: 'Cover the head.' },
  ],
  timers: [{ key: 'soak', name: 'Soak the baffle', kind: 'soak', minutes: 10 }],
  figures: [{ key: 'below', file: 'below.svg', alt: 'The cover from below.', caption: 'The cover from below' }],
  sources: [
    { key: 'demo', kind: 'demonstration', title: 'Demonstration values' },
    { key: 'shop', kind: 'shop', title: 'Shop trial' },
  ],
});
const steps: Step[] = [
  { id: 'cool', title: 'Let it cool', cautions: ['hot', 'dirt'], body: 'Wait.' },
  {
    id: 'lay',
    title: 'Lay the gasket',
    cautions: [],
    body: 'Lay the <Part of="gasket" />: <Limit of="proud" />.\n\n<Worksheet kind="readings" of="proud" />',
  },
  {
    id: 'draw',
    title: 'Draw it down',
    cautions: [],
    body: 'First to <Torque of="bolt" pass="1" />, then to <Torque of="bolt" />.\n\n<Hold>A senior technician checks.</Hold>',
  },
];
const base: Procedure = { frontmatter, intro: 'Covers weep.', steps };
const withHead = (change: Partial<Frontmatter>): Procedure => ({ ...base, frontmatter: { ...frontmatter, ...change } });
const withTorque = (change: object) =>
  withHead({ torques: frontmatter.torques.map((t) => (t.key === 'bolt' ? { ...t, ...change } : t)) });
const withStep = (id: string, change: Partial<Step>): Procedure => ({
  ...base,
  steps: steps.map((s) => (s.id === id ? { ...s, ...change } : s)),
});
const without = (id: string): Procedure => ({ ...base, steps: steps.filter((s) => s.id !== id) });

describe('value changes read as a technician says them', () => {
  const line = (to: Procedure) =>
    compareProcedures(base, to).values.map(
      (v) => `${v.label} | ${v.detail ?? ''} | ${v.from ?? ''} → ${v.to ?? ''} | ${v.percent ?? ''}`,
    );
  it.each<[string, Procedure, string[]]>([
    [
      'torque',
      withTorque({ nm: 12, passes: [6] }),
      [
        'Cover bolt | M6×1.0×25, class 8.8, dry | 10 N·m → 12 N·m | 20',
        'Cover bolt: first pass | M6×1.0×25, class 8.8, dry | 5 N·m → 6 N·m | 20',
      ],
    ],
    [
      'tolerance gone',
      withTorque({ tolerance: undefined }),
      ['Cover bolt: tolerance | M6×1.0×25, class 8.8, dry | ±1 N·m →  | '],
    ],
    ['turns', withTorque({ angles: [90] }), ['Cover bolt: first turn | M6×1.0×25, class 8.8, dry |  → 90° | ']],
    [
      'condition',
      withTorque({ condition: 'oiled' }),
      ['Cover bolt: condition | M6×1.0×25, class 8.8, oiled | dry → oiled | '],
    ],
    ['time', withHead({ minutes: 90 }), ['Bench time |  | 1 h 10 min → 1 h 30 min | 28.6']],
    ['marked', withHead({ critical: true }), ['Critical sheet |  |  → yes | ']],
    [
      'limit',
      withHead({ limits: frontmatter.limits.map((l) => (l.key === 'proud' ? { ...l, max: 1.2 } : l)) }),
      ['Gasket proud: most | cover upside down | 1.4 mm → 1.2 mm | -14.3'],
    ],
    [
      'temperature',
      withHead({ limits: frontmatter.limits.map((l) => (l.key === 'coolant' ? { ...l, max: 60 } : l)) }),
      ['Coolant: most |  | 50 °C → 60 °C | '],
    ],
    [
      'other unit',
      withHead({
        limits: frontmatter.limits.map((l) => (l.key === 'proud' ? { ...l, unit: 'in', min: 0.04, max: 0.055 } : l)),
      }),
      [
        'Gasket proud: unit | cover upside down | mm → in | ',
        'Gasket proud: least | cover upside down | 0.8 mm → 0.04 in | 27',
        'Gasket proud: most | cover upside down | 1.4 mm → 0.055 in | -0.2',
      ],
    ],
    [
      'part out',
      withHead({ parts: frontmatter.parts.slice(1) }),
      ['Cover gasket, moulded | TN-4102 | 1, replace →  | '],
    ],
    [
      'timer in',
      withHead({ timers: [...frontmatter.timers, { key: 'stand', name: 'Leave it', kind: 'wait', minutes: 1440 }] }),
      ['Leave it | wait |  → 24 h | '],
    ],
    [
      'order',
      withHead({ parts: [...frontmatter.parts].reverse() }),
      ['Order of the parts |  | Cover gasket, moulded; Cover bolt → Cover bolt; Cover gasket, moulded | '],
    ],
  ])('%s', (_name, to, want) => {
    expect(line(to)).toEqual(want);
  });
});

describe('why two editors are needed', () => {
  const newSheet = (change: Partial<Frontmatter>) =>
    compareProcedures(null, { ...withHead(change), steps: [] }).criticalReasons;
  it.each<[string, Procedure, string[]]>([
    ['a torque', withTorque({ nm: 12, passes: [6] }), ['a torque changes: Cover bolt']],
    [
      'a torque gone',
      withHead({ torques: frontmatter.torques.filter(({ key }) => key !== 'coil') }),
      ['a torque is removed: Coil bolt'],
    ],
    ['only its source', withTorque({ source: 'shop' }), []],
    [
      'a new torque',
      withHead({ torques: [...frontmatter.torques, { ...frontmatter.torques[1]!, key: 'new', name: 'New bolt' }] }),
      [],
    ],
    [
      'what happens to a part',
      withHead({ parts: frontmatter.parts.map((p) => ({ ...p, action: 'reuse' as const })) }),
      ['what happens to a part changes: Cover gasket, moulded'],
    ],
    ['a part gone', withHead({ parts: frontmatter.parts.slice(0, 1) }), ['a part is removed: Cover bolt']],
    ['a part number', withHead({ parts: frontmatter.parts.map((p) => ({ ...p, number: 'TN-1', quantity: 2 })) }), []],
    ['a cure time', withHead({ supplies: [{ ...frontmatter.supplies[0]!, cure: 720 }] }), []],
    ['the flag', withHead({ critical: true }), ['the sheet is marked critical']],
    ['words', withStep('cool', { body: 'Wait an hour.' }), []],
    [
      'a hold',
      withStep('draw', { body: steps[2]!.body.replace('checks', 'looks') }),
      ['a hold point changes in “Draw it down”'],
    ],
    [
      'a hold gone',
      withStep('draw', { body: steps[2]!.body.replace(/<Hold>.*/, '') }),
      ['a hold point is removed in “Draw it down”'],
    ],
    ['one hold more', withStep('draw', { body: `${steps[2]!.body}\n\n<Hold>Look twice.</Hold>` }), []],
    [
      'another bolt',
      withStep('draw', { body: steps[2]!.body.replace('of="bolt" />', 'of="coil" />') }),
      ['a torque is no longer given in “Draw it down”: Cover bolt'],
    ],
    [
      'passes swapped',
      withStep('draw', {
        body: 'First to <Torque of="bolt" />, then to <Torque of="bolt" pass="1" />.\n\n<Hold>A senior technician checks.</Hold>',
      }),
      ['a torque is given in another order in “Draw it down”: Cover bolt'],
    ],
    [
      'shown as code',
      withStep('draw', { body: steps[2]!.body.replace('<Torque of="bolt" />', '`<Torque of="bolt" />`') }),
      ['a torque is no longer given in “Draw it down”: Cover bolt'],
    ],
    [
      'no longer measured',
      withStep('lay', { body: steps[1]!.body.replace(/<Worksheet.*/, '') }),
      ['a limit is no longer given in “Lay the gasket”: Gasket proud'],
    ],
    [
      'a caution not shown',
      withStep('cool', { cautions: ['dirt'] }),
      ['a caution no longer stands before “Let it cool”: Hot oil'],
    ],
    ['cautions the other way round', withStep('cool', { cautions: ['dirt', 'hot'] }), []],
    [
      'a step gone',
      without('draw'),
      ['a torque is no longer given in “Draw it down”: Cover bolt', 'a hold point is removed in “Draw it down”'],
    ],
    ['a step moved', { ...base, steps: [...steps].reverse() }, []],
  ])('%s', (_name, to, want) => {
    expect(compareProcedures(base, to).criticalReasons).toEqual(want);
    expect(compareProcedures(base, to).identical).toBe(false);
  });

  it('for a new sheet: the numbers that nobody has checked', () => {
    expect(newSheet({})).toEqual([
      'a new sheet gives a torque: Cover bolt',
      'a new sheet gives a torque: Coil bolt',
      'a new sheet gives a limit: Gasket proud',
      'a new sheet gives a limit: Coolant',
    ]);
    expect(newSheet({ torques: [], limits: [] })).toEqual([]);
    expect(newSheet({ torques: [], limits: [], critical: true })).toEqual(['the sheet is marked critical']);
  });
});

describe('bodyText', () => {
  it.each([
    [
      'First to <Torque of="bolt" pass="1" />, then to <Torque of="bolt" />.',
      'First to 5 N·m (Cover bolt, first pass), then to 10 ±1 N·m (Cover bolt).',
    ],
    ['Lay the <Part of="gasket" />: <Limit of="proud" />.', 'Lay the cover gasket: 0.8 to 1.4 mm (Gasket proud).'],
    [
      'Wait <Timer of="soak" />, <Timer of="silicone" stage="cure" />.',
      'Wait 10 min (Soak the baffle), 24 h (Silicone).',
    ],
    ['<Figure of="below" />', 'Figure: The cover from below'],
    ['<Worksheet kind="readings" of="proud coolant" />', 'Worksheet: Readings; Gasket proud; Coolant'],
    ['<Hold>Check <Torque of="coil" /> with *care*.</Hold>', 'Hold point. Check 8 N·m (Coil bolt) with *care*.'],
    ['`<Torque of="bolt" />` and \\<Torque of="bolt" />', '`<Torque of="bolt" />` and \\<Torque of="bolt" />'],
    ['<Torque of="gone" />', '<Torque of="gone" />'],
    ['a  \n\n\n\nb\n', 'a\n\nb'],
  ])('%s', (body, want) => {
    expect(bodyText(body, frontmatter)).toBe(want);
  });

  it('reads hostile text in no time', () => {
    for (const body of [
      '<Hold>'.repeat(10_000),
      '`'.repeat(60_000),
      `<Torque ${'a="b" '.repeat(10_000)}`,
      '\\'.repeat(60_001),
      '<A a="'.repeat(10_000),
      '`a'.repeat(30_000),
      `<Hold>${'<A>'.repeat(20_000)}`,
    ]) {
      const start = performance.now();
      bodyText(body, frontmatter);
      actedOn(body);
      expect(performance.now() - start, body.slice(0, 12)).toBeLessThan(1000);
    }
  });
});
