import fc from 'fast-check';
import { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure, Step } from '@/domain/procedure/types';

/** Random procedures that the schema accepts, small enough that two of them often share keys and steps. */

const words = fc.constantFrom('Cover bolt', 'Head bolt', 'Drain plug', 'Gasket', 'Oil, hot', 'Wipe it clean');
const key = fc.constantFrom('cover-bolt', 'head-bolt', 'drain-plug', 'gasket');
const nm = fc.constantFrom(5, 8, 10, 12, 20, 25.5);
const optional = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: undefined });
const keyed = <T extends { key: string }>(entry: fc.Arbitrary<T>) =>
  fc.uniqueArray(entry, { selector: (e) => e.key, maxLength: 3 });

const torque = fc.record({
  key,
  name: words,
  thread: fc.constantFrom('M6', 'M8'),
  pitch: fc.constantFrom(1, 1.25),
  condition: fc.constantFrom('dry' as const, 'oiled' as const),
  nm,
  tolerance: optional(fc.constantFrom(1, 2)),
  passes: optional(fc.constantFrom([2], [3], [2, 4])),
  angles: optional(fc.constantFrom([90], [90, 90])),
  count: fc.constantFrom(2, 4),
  note: optional(words),
});
const limit = fc.record({
  key,
  name: words,
  quantity: fc.constant('length' as const),
  unit: fc.constantFrom('mm', 'in'),
  min: optional(fc.constantFrom(0.1, 0.2)),
  max: fc.constantFrom(0.3, 0.4),
  resolution: optional(fc.constantFrom(0.01, 0.05)),
});
const caution = fc.record({
  key,
  signal: fc.constantFrom('WARNING' as const, 'NOTICE' as const),
  hazard: words,
  harm: words,
  avoid: words,
});
const part = fc.record({
  key,
  name: words,
  quantity: fc.constantFrom(1, 2),
  action: fc.constantFrom('replace' as const, 'inspect' as const),
});
const timer = fc.record({ key, name: words, kind: fc.constant('soak' as const), minutes: fc.constantFrom(5, 10) });

export const frontmatter: fc.Arbitrary<Frontmatter> = fc
  .record({
    title: words,
    summary: words,
    system: fc.constantFrom('sealing' as const, 'fuel' as const),
    engines: fc.constantFrom(['tarn-t18f'], ['tarn-t18f', 'tarn-t24d']),
    minutes: fc.constantFrom(30, 45),
    skill: fc.constantFrom('apprentice' as const, 'senior' as const),
    critical: fc.boolean(),
    parts: keyed(part),
    torques: keyed(torque),
    limits: keyed(limit),
    cautions: keyed(caution),
    timers: keyed(timer),
  })
  .map((input) => Frontmatter.parse(JSON.parse(JSON.stringify(input))));

const sentence = fc
  .array(
    fc.constantFrom(
      'Tighten to',
      '<Torque of="cover-bolt" />.',
      '<Torque of="head-bolt" pass="1" />.',
      'Check <Limit of="gasket" />.',
      'Lay the <Part of="gasket" />',
      '10 N·m',
      '±0.5 mm',
      'and wait.',
    ),
    { minLength: 1, maxLength: 6 },
  )
  .map((parts) => parts.join(' '));
const paragraph = fc.oneof(
  { weight: 4, arbitrary: sentence },
  { weight: 1, arbitrary: sentence.map((text) => `<Hold>${text}</Hold>`) },
  { weight: 1, arbitrary: sentence.map((text) => `- ${text}\n- ${text}`) },
);
const body = fc.array(paragraph, { maxLength: 3 }).map((paragraphs) => paragraphs.join('\n\n'));

const step: fc.Arbitrary<Step> = fc.record({
  id: fc.constantFrom('a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'),
  title: words,
  cautions: fc.uniqueArray(key, { maxLength: 2 }),
  body,
});

export const procedure: fc.Arbitrary<Procedure> = fc.record({
  frontmatter,
  intro: body,
  steps: fc.uniqueArray(step, { selector: ({ id }) => id, maxLength: 8 }),
});

/** A close relative: a procedure with some of its parts exchanged. */
const relativeOf = (one: Procedure): fc.Arbitrary<Procedure> =>
  fc
    .tuple(procedure, fc.record({ front: fc.boolean(), intro: fc.boolean(), shuffle: fc.boolean(), mix: fc.nat(255) }))
    .chain(([other, keep]) => {
      const steps = other.steps.map((s, i) =>
        (keep.mix >> i) & 1 ? s : (one.steps.find(({ id }) => id === s.id) ?? s),
      );
      const order = keep.shuffle ? fc.shuffledSubarray(steps, { minLength: steps.length }) : fc.constant(steps);
      return order.map((arranged) => ({
        frontmatter: keep.front ? one.frontmatter : other.frontmatter,
        intro: keep.intro ? one.intro : other.intro,
        steps: arranged,
      }));
    });

/** Two procedures, as often as not close relatives: the second is the first with some of its parts exchanged. */
export const pair: fc.Arbitrary<[Procedure, Procedure]> = procedure.chain((one) =>
  fc.tuple(fc.constant(one), relativeOf(one)),
);

/** A few of the fields of one front matter, the others of another. */
const mixed = (one: Frontmatter, other: Frontmatter): fc.Arbitrary<Frontmatter> =>
  fc
    .subarray(Object.keys(one) as (keyof Frontmatter)[])
    .map((names) => ({ ...one, ...Object.fromEntries(names.map((name) => [name, other[name]])) }));

/** A base and two texts made from it, each of which changed some of it. */
export const triple: fc.Arbitrary<[Procedure, Procedure, Procedure]> = procedure.chain((one) => {
  const child = relativeOf(one).chain((child) =>
    mixed(one.frontmatter, child.frontmatter).map((head) => ({ ...child, frontmatter: head })),
  );
  return fc.tuple(fc.constant(one), child, child);
});
