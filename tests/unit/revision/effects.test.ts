import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreementsNeeded } from '@/domain/review/rules';
import { Frontmatter, SIGNAL_WORDS, type Limit } from '@/domain/procedure/schema';
import type { Procedure, Step } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { pair, procedure } from './arbitraries';

const frontmatter = Frontmatter.parse({
  title: 'Reseal the cover',
  summary: 'Stop it weeping.',
  system: 'sealing',
  engines: ['tarn-t18f'],
  minutes: 70,
  skill: 'apprentice',
  parts: [{ key: 'gasket', name: 'Cover gasket', quantity: 1, action: 'replace' }],
  supplies: [{ key: 'silicone', name: 'Silicone', skinOver: 10, cure: 1440 }],
  torques: [
    {
      key: 'bolt',
      name: 'Cover bolt',
      thread: 'M6',
      pitch: 1,
      class: '8.8',
      condition: 'dry',
      nm: 10,
      tolerance: 1,
      passes: [4, 7],
      angles: [90],
      count: 4,
      positions: [
        [0, 0],
        [50, 0],
        [0, 50],
        [50, 50],
      ],
      order: [1, 4, 2, 3],
    },
    { key: 'coil', name: 'Coil bolt', thread: 'M6', pitch: 1, class: '8.8', condition: 'dry', nm: 8, count: 4 },
  ],
  limits: [
    {
      key: 'gap',
      name: 'Gap',
      quantity: 'length',
      unit: 'mm',
      min: 0.1,
      max: 0.3,
      resolution: 0.01,
      condition: 'cold',
    },
  ],
  cautions: [
    {
      key: 'hot',
      signal: 'WARNING',
      hazard: 'Hot oil',
      harm: 'burns skin at once',
      avoid: 'Never loosen the cover before the engine is below 50 °C.',
    },
  ],
  timers: [{ key: 'soak', name: 'Soak', kind: 'soak', minutes: 10 }],
});
const steps: Step[] = [
  { id: 'cool', title: 'Let it cool', cautions: ['hot'], body: 'Wait.' },
  {
    id: 'draw',
    title: 'Draw it down',
    cautions: [],
    body: 'To <Torque of="coil" />.\n\n<Hold>Somebody checks.</Hold>',
  },
  { id: 'look', title: 'Look', cautions: [], body: 'Look for oil.' },
];
const base: Procedure = { frontmatter, intro: '', steps };
type List = 'torques' | 'limits' | 'cautions' | 'parts' | 'timers' | 'supplies';
const withEntry = (list: List, change: object, at = 0): Procedure => ({
  ...base,
  frontmatter: { ...frontmatter, [list]: frontmatter[list].map((e, i) => (i === at ? { ...e, ...change } : e)) },
});
const without = (list: List): Procedure => ({ ...base, frontmatter: { ...frontmatter, [list]: [] } });
const withStep = (id: string, change: Partial<Step>, of: Procedure = base): Procedure => ({
  ...of,
  steps: of.steps.map((s) => (s.id === id ? { ...s, ...change } : s)),
});
const told = (to: Procedure) => {
  const { values, steps: changed, severity } = compareProcedures(base, to);
  return {
    effects: [...values.flatMap(({ effect }) => effect ?? []), ...changed.flatMap(({ effects }) => effects)],
    level: severity.level,
    first: severity.because[0],
  };
};

describe('what a change does at the bench', () => {
  it.each<[string, Procedure, string[], string, string?]>([
    ['limit', withEntry('limits', { max: 0.32 }), ['Wider: allows 0.02 mm more'], 'grave', 'the limit “Gap” is wider'],
    ['limit', withEntry('limits', { max: 0.25 }), ['Narrower: allows 0.05 mm less'], 'serious'],
    ['limit', withEntry('limits', { min: 0.05 }), ['Wider: asks for 0.05 mm less'], 'grave'],
    ['limit', withEntry('limits', { min: 0.15 }), ['Narrower: asks for 0.05 mm more'], 'serious'],
    ['limit', withEntry('limits', { max: undefined }), ['Wider: no most is given any longer'], 'grave'],
    [
      'limit, both ends',
      withEntry('limits', { min: 0.2, max: 0.4 }),
      ['Moved: asks for 0.1 mm more', 'Moved: allows 0.1 mm more'],
      'grave',
      'the limit “Gap” moves and lets through what was out',
    ],
    [
      'limit in another unit',
      withEntry('limits', { unit: 'µm', min: 100, max: 320, resolution: 10 }),
      ['The same in another unit', 'Wider: allows 20 µm more'],
      'grave',
    ],
    [
      'limit rounded in inches',
      withEntry('limits', { unit: 'in', min: 0.00394, max: 0.01182, resolution: 0.0002 }),
      ['The same in another unit', 'The same in another unit', 'Read more finely'],
      'serious',
    ],
    ['resolution', withEntry('limits', { resolution: 0.05 }), ['Read more coarsely'], 'serious'],
    ['state', withEntry('limits', { condition: 'warm' }), ['Measured in another state'], 'serious'],
    ['no limit', without('limits'), ['Wider: any reading will do'], 'grave', 'the limit “Gap” is removed'],
    [
      'signal',
      withEntry('cautions', { signal: 'CAUTION' }),
      ['Weaker: a lower signal word'],
      'grave',
      'the caution “Hot oil” is weaker',
    ],
    [
      'signal',
      withEntry('cautions', { signal: 'NOTICE' }),
      ['Weaker: no longer says that anybody can be hurt'],
      'grave',
    ],
    ['signal', withEntry('cautions', { signal: 'DANGER' }), ['Stronger: DANGER, where it was WARNING'], 'serious'],
    ['harm', withEntry('cautions', { harm: 'burns skin' }), ['Weaker: words are taken out'], 'grave'],
    ['harm', withEntry('cautions', { harm: 'burns skin and eyes at once' }), ['Says more than before'], 'serious'],
    [
      'avoid',
      withEntry('cautions', { avoid: 'Loosen the cover when the engine is below 50 °C.' }),
      ['Weaker: no longer says “never”'],
      'grave',
    ],
    [
      'avoid',
      withEntry('cautions', { avoid: 'Never loosen the cover before the engine is as cool as your hand.' }),
      ['Weaker: a number is taken out'],
      'grave',
    ],
    ['avoid', withEntry('cautions', { harm: 'scalds hands at once' }), ['Put in other words'], 'serious'],
    [
      'no caution',
      withStep('cool', { cautions: [] }, without('cautions')),
      ['Nobody is warned of it any longer', 'Whoever works here is no longer warned'],
      'grave',
      'the caution “Hot oil” is removed',
    ],
    [
      'caution not ahead',
      withStep('cool', { cautions: [] }),
      ['Whoever works here is no longer warned'],
      'grave',
      'the caution “Hot oil” no longer stands before “Let it cool”',
    ],
    [
      'caution elsewhere',
      withStep('draw', { cautions: ['hot'] }, withStep('cool', { cautions: [] })),
      ['“Hot oil” stands before another step now', 'Warns of “Hot oil” now'],
      'serious',
    ],
    [
      'hold',
      withStep('draw', { body: 'To <Torque of="coil" />.' }),
      ['Nobody needs to check here any longer'],
      'grave',
      'a hold point is dropped in “Draw it down”',
    ],
    [
      'hold elsewhere',
      withStep(
        'look',
        { body: '<Hold>Somebody checks.</Hold>' },
        withStep('draw', { body: 'To <Torque of="coil" />.' }),
      ),
      ['Its hold point stands in another step now', 'A hold point more'],
      'serious',
    ],
    [
      'hold reworded',
      withStep('draw', { body: 'To <Torque of="coil" />.\n\n<Hold>Somebody looks.</Hold>' }),
      ['Its hold point is put in other words'],
      'serious',
    ],
    ['hold added', withStep('look', { body: '<Hold>Look twice.</Hold>' }), ['A hold point more'], 'ordinary'],
    [
      'part',
      withEntry('parts', { action: 'reuse' }),
      ['Used again, where a new one was fitted'],
      'grave',
      'the part “Cover gasket” is used again, not replaced',
    ],
    ['part', withEntry('parts', { action: 'inspect' }), ['Only inspected, where a new one was fitted'], 'serious'],
    ['torque', withEntry('torques', { nm: 7 }, 1), ['Looser: 1 N·m less'], 'serious', 'a torque changes (Coil bolt)'],
    ['torque', withEntry('torques', { nm: 9.5 }, 1), ['Tighter: 1.5 N·m more'], 'serious'],
    [
      'past proof',
      withEntry('torques', { nm: 20 }, 1),
      ['Tighter: 12 N·m more'],
      'grave',
      '“Coil bolt” is tightened past its proof load',
    ],
    [
      'mix-up',
      withEntry('torques', { nm: 5.9 }, 1),
      ['Looser: 2.1 N·m less'],
      'grave',
      '“Coil bolt” looks like a mix-up of units',
    ],
    ['tolerance', withEntry('torques', { tolerance: 1.5 }), ['Looser: 0.5 N·m more either way'], 'serious'],
    ['tolerance', withEntry('torques', { tolerance: 0.5 }), ['Closer: 0.5 N·m less either way'], 'serious'],
    ['passes', withEntry('torques', { passes: [4] }), ['One pass fewer'], 'serious'],
    ['turns', withEntry('torques', { angles: [] }), ['One turn fewer: it clamps less'], 'serious'],
    ['turns', withEntry('torques', { angles: [60] }), ['Turned 30° less far'], 'serious'],
    ['class', withEntry('torques', { class: '10.9' }), ['A stronger fastener'], 'serious'],
    ['class', withEntry('torques', { class: '12.9' }, 1), ['A stronger fastener'], 'serious'],
    ['order', withEntry('torques', { order: [1, 2, 3, 4] }), ['Tightened in another order'], 'serious'],
    ['timer', withEntry('timers', { minutes: 5 }), ['Shorter: 5 min less to wait'], 'ordinary'],
    ['cure', withEntry('supplies', { cure: 720 }), ['Shorter: 12 h less before it is put to use'], 'ordinary'],
    ['name', withEntry('timers', { name: 'Soak it' }), [], 'ordinary'],
  ])('%s %#', (_what, to, effects, level, first) => {
    const got = told(to);
    expect(got.effects).toEqual(effects);
    expect(got.level).toBe(level);
    if (first) expect(got.first).toBe(first);
  });
});

describe('how grave a change is', () => {
  it('a limit is wider exactly where a reading passes that failed before', () => {
    const end = fc.option(fc.integer({ min: 0, max: 8 }), { nil: undefined });
    const ends = fc
      .record({ min: end, max: end })
      .filter(({ min, max }) => (min ?? max) !== undefined && (min ?? 0) <= (max ?? 8));
    const passes = ({ min = -Infinity, max = Infinity }: Pick<Limit, 'min' | 'max'>, x: number) => x >= min && x <= max;
    fc.assert(
      fc.property(ends, ends, (old, now) => {
        const limit = (of: object) =>
          Frontmatter.parse({ ...frontmatter, limits: [{ ...frontmatter.limits[0], ...of }] });
        const sheet = (of: object): Procedure => ({ ...base, frontmatter: limit(of) });
        const readings = Array.from({ length: 40 }, (_, i) => -1 + i / 4);
        const lets = readings.some((x) => passes(now, x) && !passes(old, x));
        const from = sheet({ min: old.min, max: old.max });
        const { severity } = compareProcedures(from, sheet({ min: now.min, max: now.max }));
        expect(severity.level === 'grave').toBe(lets);
      }),
      { numRuns: 400 },
    );
  });

  it('a lower signal word is graver than any other change of it', () => {
    const signal = fc.constantFrom(...SIGNAL_WORDS);
    fc.assert(
      fc.property(signal, signal, (old, now) => {
        const { severity } = compareProcedures(
          withEntry('cautions', { signal: old }),
          withEntry('cautions', { signal: now }),
        );
        const order = SIGNAL_WORDS.indexOf(now) - SIGNAL_WORDS.indexOf(old);
        expect(severity.level).toBe(order > 0 ? 'grave' : order < 0 ? 'serious' : 'ordinary');
      }),
    );
  });

  it('never changes how many must agree: two for all that is grave or serious, one for the rest', () => {
    fc.assert(
      fc.property(fc.oneof(pair, fc.tuple(fc.constant(null), procedure)), ([from, to]) => {
        const { severity, criticalReasons } = compareProcedures(from, to);
        expect(agreementsNeeded(criticalReasons)).toBe(criticalReasons.length > 0 ? 2 : 1);
        expect(agreementsNeeded(criticalReasons)).toBe(severity.level === 'ordinary' ? 1 : 2);
        expect(severity.because.length > 0).toBe(severity.level !== 'ordinary');
      }),
      { numRuns: 300 },
    );
  });

  it('is no ordinary addition where a torque comes that cannot be right for its fastener', () => {
    const added = (nm: number): Procedure => ({
      ...base,
      frontmatter: {
        ...frontmatter,
        torques: [...frontmatter.torques, { ...frontmatter.torques[1]!, key: 'new', name: 'New bolt', nm }],
      },
    });
    expect(compareProcedures(base, added(8))).toMatchObject({ criticalReasons: [], severity: { level: 'ordinary' } });
    expect(compareProcedures(base, added(20))).toMatchObject({
      criticalReasons: ['an added torque is past its proof load: New bolt'],
      severity: { level: 'grave', because: ['“New bolt” is tightened past its proof load'] },
    });
  });
});
