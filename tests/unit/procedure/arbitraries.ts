import fc from 'fast-check';
import { toSource } from '@/domain/procedure/canonical';
import { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure, Step } from '@/domain/procedure/types';

/** Words as people type them, with the signs that Markdown, YAML and HTML take for their own. */
const nastyWord = fc.constantFrom(
  'cover', 'bolt', 'and', 'the', '10', '1.', '2)', '-', '+', '#', '>', '*', '**', '_', '`', '``', '~', '~~', '|', '\\',
  '!', '[', ']', '(x)', '&', '&amp;', '&lt;', '"', "'", ':', '- ', '---', '===', '***', '<!', 'a*b', 'a_b_c', '*a*', '**b**',
  '_c_', '`d`', 'x|y', 'www.', 'https://halden.example/a_b', '@', 'a@b', '°C', 'µm', 'N·m', '±', '½', '中文', '🔧', 'é', 'e\u0301',
  '\u00a0', '1986\\.', '{', '}', '<', '</', '/>', 'null', 'true', 'no', '~', '0x1f', '1e3', '2026-12-01', '%', '? ', '!x', '&x', '*x', '@x',
); // prettier-ignore

const FORBIDDEN =
  /[\u0000-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069\ufeff\ufff9-\uffff]|\p{Surrogate}/gu;

const clean = (text: string, most: number) =>
  text.replace(FORBIDDEN, '').replace(/\s+/g, ' ').slice(0, most).replace(FORBIDDEN, '').trim();

/** One line of text, 1 to `most` characters, trimmed, of any characters a sheet may hold. */
export const lineOf = (most: number) =>
  fc
    .oneof(
      { weight: 3, arbitrary: fc.array(nastyWord, { minLength: 1, maxLength: 8 }).map((w) => w.join(' ')) },
      { weight: 1, arbitrary: fc.string({ unit: 'grapheme', minLength: 1, maxLength: 60 }) },
    )
    .map((text) => clean(text, most) || 'x');

const decimal = (min: number, max: number) => fc.integer({ min: min * 1000, max: max * 1000 }).map((n) => n / 1000);
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: undefined });
const withoutGaps = <T extends object>(value: T): T =>
  Object.fromEntries(Object.entries(value).filter(([, v]) => v !== undefined)) as T;

export const KEYS = ['alpha', 'beta-2', 'gamma'] as const;

const listOf = <T extends object>(fields: (key: string) => fc.Arbitrary<T>) =>
  fc
    .subarray([...KEYS])
    .chain((keys) => fc.tuple(...keys.map((key) => fields(key).map((entry) => withoutGaps({ key, ...entry })))));

const torque = () =>
  fc.integer({ min: 1, max: 6 }).chain((count) =>
    fc.record({
      name: lineOf(90),
      thread: fc.constantFrom('M6', 'M10'),
      pitch: fc.constantFrom(0.75, 1, 1.25),
      length: maybe(decimal(1, 200)),
      class: maybe(fc.constantFrom('8.8', '10.9', 'SAE 5')),
      condition: fc.constantFrom('dry', 'oiled', 'threadlocker', 'sealant', 'anti-seize'),
      nm: decimal(10, 200),
      tolerance: maybe(decimal(1, 9)),
      passes: maybe(fc.constant([2, 5.5])),
      angles: maybe(fc.constant([90, 45])),
      count: fc.constant(count),
      positions: fc.array(fc.tuple(decimal(-500, 500), decimal(-500, 500)), { minLength: count, maxLength: count }),
      order: fc.shuffledSubarray(
        Array.from({ length: count }, (_, i) => i + 1),
        { minLength: count, maxLength: count },
      ),
      note: maybe(lineOf(160)),
    }),
  );

const limit = () =>
  fc.oneof(
    fc.record({
      name: lineOf(90),
      quantity: fc.constant('finding'),
      expect: lineOf(80),
      condition: maybe(lineOf(120)),
    }),
    fc
      .tuple(
        fc.constantFrom(['length', 'mm'], ['pressure', 'kPa'], ['temperature', '°C'], ['torque', 'N·m']),
        decimal(0, 50),
        decimal(0, 50),
      )
      .chain(([[quantity, unit], low, more]) =>
        fc.record({
          name: lineOf(90),
          quantity: fc.constant(quantity),
          unit: fc.constant(unit),
          min: maybe(fc.constant(low)),
          max: fc.constant(Math.round((low + more) * 1000) / 1000),
          resolution: maybe(fc.constantFrom(0.01, 0.05, 1)),
        }),
      ),
  );

/** A valid front matter, defaults and gaps as the parser leaves them. */
export const frontmatter = fc
  .record({
    title: lineOf(90),
    summary: lineOf(300),
    system: fc.constantFrom('sealing', 'checks'),
    engines: fc.constantFrom(['tarn-t18f'], ['tarn-t18f', 'brandreth-b3']),
    minutes: fc.integer({ min: 1, max: 10_000 }),
    skill: fc.constantFrom('apprentice', 'technician', 'senior'),
    critical: fc.boolean(),
    parts: listOf(() => fc.record({ name: lineOf(90), number: maybe(lineOf(40)), quantity: fc.integer({ min: 1, max: 999 }), action: fc.constantFrom('replace', 'inspect', 'reuse'), note: maybe(lineOf(160)) })),
    tools: listOf(() => fc.record({ name: lineOf(90), range: maybe(lineOf(60)) })),
    supplies: listOf(() => fc.record({ name: lineOf(90), skinOver: maybe(decimal(1, 100)), cure: maybe(fc.constantFrom(30, 1440)) })),
    torques: listOf(torque),
    limits: listOf(limit),
    cautions: listOf(() => fc.record({ signal: fc.constantFrom('DANGER', 'WARNING', 'CAUTION', 'NOTICE'), hazard: lineOf(160), harm: lineOf(160), avoid: lineOf(240) })),
    timers: listOf(() => fc.record({ name: lineOf(90), kind: fc.constantFrom('soak', 'cure'), minutes: decimal(1, 500) })),
    figures: listOf(() => fc.record({ file: fc.constantFrom('cover.svg', 'pan-2.svg'), alt: lineOf(300), caption: lineOf(160) })),
    sources: listOf(() => fc.record({ kind: fc.constantFrom('shop', 'standard'), title: lineOf(160) })),
  })
  .map((head) => Frontmatter.parse(head)); // prettier-ignore

/** Components that point at what the front matter has, and now and then at what it has not. */
function values(head: Frontmatter): fc.Arbitrary<string> {
  const all = [
    ...head.torques.map((t) => `<Torque of="${t.key}" />`),
    ...head.torques.filter((t) => t.passes).map((t) => `<Torque of="${t.key}" pass="2" />`),
    ...head.limits.map((l) => `<Limit of="${l.key}" />`),
    ...head.parts.map((p) => `<Part of="${p.key}" />`),
    ...head.timers.map((t) => `<Timer of="${t.key}" />`),
    ...head.supplies.filter((s) => s.cure !== undefined).map((s) => `<Timer of="${s.key}" stage="cure" />`),
  ];
  return all.length ? fc.constantFrom(...all) : fc.constant('word');
}

const escaped = (word: string) => word.replace(/[\\`*_{}[\]()#+.!<>|~&@:-]/g, '\\$&');

const sentence = (head: Frontmatter) =>
  fc
    .array(
      fc.oneof(
        { weight: 3, arbitrary: nastyWord.map(escaped) },
        { weight: 2, arbitrary: values(head) },
        { weight: 1, arbitrary: nastyWord.map((w) => `*${escaped(w.trim() || 'x')}*`) },
        { weight: 1, arbitrary: nastyWord.map((w) => `**${escaped(w.trim() || 'x')}**`) },
        { weight: 1, arbitrary: nastyWord.map((w) => `\`\`\` ${w.replace(/`/g, '') || 'x'} \`\`\``) },
        { weight: 1, arbitrary: nastyWord.map((w) => `[${escaped(w.trim() || 'x')}](/handbook/units)`) },
      ),
      { minLength: 1, maxLength: 8 },
    )
    .chain((words) =>
      fc
        .constantFrom(' ', '\n')
        .map((gap) => words.join(gap === '\n' && words.some((w) => w.startsWith('<')) ? ' ' : gap)),
    );

const passage = (head: Frontmatter): fc.Arbitrary<string> =>
  fc.oneof(
    { weight: 4, arbitrary: sentence(head) },
    { weight: 1, arbitrary: fc.array(sentence(head), { minLength: 1, maxLength: 3 }).map((s) => s.map((x) => `- ${x.replace(/\n/g, ' ')}`).join('\n')) },
    { weight: 1, arbitrary: fc.array(sentence(head), { minLength: 1, maxLength: 3 }).map((s) => s.map((x, i) => `${i + 4}. ${x.replace(/\n/g, ' ')}`).join('\n\n')) },
    { weight: 1, arbitrary: sentence(head).map((s) => `> ${s.replace(/\n/g, ' ')}`) },
    { weight: 1, arbitrary: fc.tuple(sentence(head), sentence(head)).map((s) => `| ${s.map((x) => x.replace(/\n/g, ' ')).join(' | ')} |\n| - | :-: |\n| a | b |`) },
    { weight: 1, arbitrary: fc.constantFrom(...head.figures.map((f) => `<Figure of="${f.key}" />`), ...head.limits.map((l) => `<Worksheet kind="readings" of="${l.key}" />`), '<Hold>A senior technician looks.</Hold>') },
  ); // prettier-ignore

const step = (head: Frontmatter): fc.Arbitrary<Omit<Step, 'id'>> =>
  fc.record({
    title: lineOf(90),
    cautions: fc.subarray(head.cautions.map((c) => c.key)),
    body: fc.array(passage(head), { maxLength: 4 }).map((p) => p.join('\n\n')),
  });

/** A procedure whose prose is not yet canonical, as somebody may have typed it. */
export const typedProcedure: fc.Arbitrary<Procedure> = frontmatter.chain((head) =>
  fc.record({
    frontmatter: fc.constant(head),
    intro: fc.oneof(fc.constant(''), sentence(head)),
    steps: fc
      .array(step(head), { minLength: 1, maxLength: 4 })
      .map((steps) => steps.map((s, i): Step => ({ id: `step-${i + 1}`, ...s }))),
  }),
);

/** A short head to put fuzzed bodies under. */
export const PLAIN_HEAD = Frontmatter.parse({
  title: 'Try it',
  summary: 'A head for bodies under test.',
  system: 'checks',
  engines: ['tarn-t18f'],
  minutes: 5,
  skill: 'apprentice',
  parts: [{ key: 'gasket', name: 'Cover gasket, moulded', quantity: 1, action: 'replace' }],
  torques: [{ key: 'bolt', name: 'Cover bolt', thread: 'M6', pitch: 1, condition: 'dry', nm: 10, tolerance: 1, passes: [5], count: 1 }],
  limits: [{ key: 'gap', name: 'Gap', quantity: 'length', unit: 'mm', min: 0.2, max: 0.4, resolution: 0.01 }],
  cautions: [{ key: 'hot', signal: 'WARNING', hazard: 'Hot oil', harm: 'burns', avoid: 'Let it cool.' }],
  timers: [{ key: 'soak', name: 'Soak', kind: 'soak', minutes: 10 }],
  figures: [{ key: 'under', file: 'under.svg', alt: 'The underside', caption: 'Underside' }],
}); // prettier-ignore

export const withBody = (body: string) =>
  toSource({ frontmatter: PLAIN_HEAD, intro: '', steps: [{ id: 'one', title: 'One', cautions: [], body }] });
