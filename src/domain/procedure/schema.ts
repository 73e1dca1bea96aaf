import { z } from 'zod';
import { SKILLS, SYSTEMS, type System } from './systems';
import { UNITS_BY_QUANTITY, type Quantity, QUANTITIES } from '../measure/quantities';

/**
 * The one description of a procedure's front matter. The content collection, the parser, the
 * writing form, the API and the comparison all use it, so a rule is written here once.
 *
 * Body text never repeats a value that stands here: it points at it by `key`.
 */

export { SKILLS, SYSTEMS, type System };
const SYSTEM_KEYS = Object.keys(SYSTEMS) as [System, ...System[]];

/** ANSI Z535.6 signal words, worst first. NOTICE never concerns a person. */
export const SIGNAL_WORDS = ['DANGER', 'WARNING', 'CAUTION', 'NOTICE'] as const;
/** State of the thread when the torque is applied; it sets the nut factor. */
export const CONDITIONS = ['dry', 'oiled', 'threadlocker', 'sealant', 'anti-seize'] as const;
export const PART_ACTIONS = ['replace', 'inspect', 'reuse'] as const;
export const TIMER_KINDS = ['soak', 'skin-over', 'cure', 'wait', 'retorque'] as const;
export const SOURCE_KINDS = ['maker', 'standard', 'shop', 'practice', 'demonstration'] as const;

const line = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'must not be empty')
    .max(max, `must be ${max} characters or fewer`)
    .regex(/^[^\r\n]*$/, 'must be on one line');

/** Name by which the body points at an entry, for example `cover-bolt`. */
export const Key = z
  .string()
  .max(40, 'must be 40 characters or fewer')
  .regex(/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/, 'must be small letters, digits and single hyphens, for example cover-bolt');

const minutes = z.number().positive('must be more than zero').max(43_200, 'must be 30 days or less');

export const Part = z
  .object({
    key: Key,
    /** What it is called at the bench, for example "Cover gasket, moulded". */
    name: line(90),
    /** The maker's part number. */
    number: line(40).optional(),
    quantity: z.number().int('must be a whole number').min(1).max(999),
    action: z.enum(PART_ACTIONS),
    note: line(160).optional(),
  })
  .strict();

export const Tool = z
  .object({
    key: Key,
    name: line(90),
    /** Working range with its unit, for example "2 to 25 N·m". */
    range: line(60).optional(),
    note: line(160).optional(),
  })
  .strict();

export const Supply = z
  .object({
    key: Key,
    name: line(90),
    note: line(160).optional(),
    /** Minutes until a skin forms and the joint must be closed. */
    skinOver: minutes.optional(),
    /** Minutes until full cure: no fluid, no pressure before then. */
    cure: minutes.optional(),
  })
  .strict();

/** Metric (`M6`) with a pitch in mm, or inch with threads per inch (`1/4-20 UNC`). */
export const Thread = z
  .string()
  .regex(
    /^(M\d{1,2}(\.\d)?|(#\d{1,2}|\d{1,2}\/\d{1,2}|\d)-\d{1,2} UN[CF]|[RG]p? ?\d{1,2}(\/\d{1,2})?)$/,
    'must be a thread, for example M6, 1/4-20 UNC or G 1/4',
  );

/** A torque to work to. Torques in N·m, lengths in mm, angles in degrees. */
export const Torque = z
  .object({
    key: Key,
    name: line(90),
    thread: Thread,
    /** Thread pitch in mm; metric threads only. */
    pitch: z.number().positive().max(6).optional(),
    /** Length under the head in mm. */
    length: z.number().positive().max(600).optional(),
    /** ISO 898-1 property class such as "8.8", or an SAE J429 grade such as "SAE 5". */
    class: line(20).optional(),
    condition: z.enum(CONDITIONS),
    /** Final torque in N·m; before `angles`, where there are any. */
    nm: z.number().positive('must be more than zero').max(2000, 'must be 2000 N·m or less'),
    /** Plus or minus, in N·m. */
    tolerance: z.number().positive().max(200).optional(),
    /** Torque of each pass before the final one, in N·m, rising. */
    passes: z.array(z.number().positive()).max(6).optional(),
    /** Turns after the final torque, in degrees, in the order they are made. */
    angles: z.array(z.number().positive().max(360)).max(4).optional(),
    /** Plus or minus for each angle, in degrees. */
    angleTolerance: z.number().positive().max(45).optional(),
    count: z.number().int('must be a whole number').min(1).max(200),
    /** Where each bolt stands, seen from its head: [x right, y down] in mm, bolt 1 first. */
    positions: z
      .array(z.tuple([z.number().min(-5000).max(5000), z.number().min(-5000).max(5000)]))
      .max(200)
      .optional(),
    /** Bolt numbers (places in `positions`, from 1) in the order they are tightened. */
    order: z.array(z.number().int().min(1)).max(200).optional(),
    /** Key of the entry in `sources` that the value comes from. */
    source: Key.optional(),
    note: line(160).optional(),
  })
  .strict()
  .superRefine((t, ctx) => {
    const bad = (path: (string | number)[], message: string) => ctx.addIssue({ code: 'custom', path, message });
    if (/^M/.test(t.thread) && t.pitch === undefined)
      bad(['pitch'], 'is missing: a metric thread needs its pitch in mm');
    if (!/^M/.test(t.thread) && t.pitch !== undefined) bad(['pitch'], 'belongs to metric threads only');
    if (t.tolerance !== undefined && t.tolerance >= t.nm) bad(['tolerance'], 'must be smaller than the torque itself');
    if (t.angleTolerance !== undefined && !t.angles?.length) bad(['angleTolerance'], 'needs an angle to apply to');
    t.passes?.forEach((pass, i, all) => {
      const before = i === 0 ? 0 : (all[i - 1] ?? 0);
      if (pass <= before || pass >= t.nm)
        bad(['passes', i], 'must rise from pass to pass and stay below the final torque');
    });
    if (t.positions && t.positions.length !== t.count)
      bad(['positions'], `must name ${t.count} places, one for each bolt, but names ${t.positions.length}`);
    if (t.order) {
      if (!t.positions) bad(['order'], 'needs positions, so that it can be drawn');
      const seen = new Set(t.order);
      if (t.order.length !== t.count || seen.size !== t.count || t.order.some((n) => n > t.count))
        bad(['order'], `must name each bolt from 1 to ${t.count} exactly once`);
    }
  });

/** A value to measure against: numbers in `unit`, or a plain finding in `expect`. */
export const Limit = z
  .object({
    key: Key,
    name: line(90),
    quantity: z.enum(QUANTITIES),
    unit: z.string().max(12).optional(),
    min: z.number().optional(),
    max: z.number().optional(),
    nominal: z.number().optional(),
    /** Resolution of the tool the value is read with, in `unit`; values are shown rounded to it. */
    resolution: z.number().positive().optional(),
    /** The state it is measured in, for example "cold, cap torqued". */
    condition: line(120).optional(),
    /** For a finding without a number, for example "none allowed". */
    expect: line(80).optional(),
    source: Key.optional(),
    note: line(160).optional(),
  })
  .strict()
  .superRefine((l, ctx) => {
    const bad = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message });
    const numbers = [l.min, l.nominal, l.max].filter((n): n is number => n !== undefined);
    if (l.quantity === 'finding') {
      if (!l.expect) bad('expect', 'is missing: say what must be found, for example none allowed');
      if (numbers.length || l.unit) bad('quantity', 'a finding carries no number and no unit');
      return;
    }
    if (l.expect) bad('expect', 'belongs to a finding; a measured limit has numbers');
    if (!numbers.length) bad('quantity', 'needs at least one of min, nominal and max');
    const units: readonly string[] = UNITS_BY_QUANTITY[l.quantity as Exclude<Quantity, 'finding'>];
    if (!l.unit) bad('unit', `is missing: ${l.quantity} is given in ${units.join(', ')}`);
    else if (!units.includes(l.unit)) bad('unit', `"${l.unit}" is no unit of ${l.quantity}; use ${units.join(', ')}`);
    if (numbers.some((n, i) => i > 0 && n < (numbers[i - 1] ?? n))) bad('max', 'min, nominal and max must not fall');
  });

export const Caution = z
  .object({
    key: Key,
    signal: z.enum(SIGNAL_WORDS),
    /** What can hurt: "Hot oil and hot metal". */
    hazard: line(160),
    /** What it does: "burn skin at once". */
    harm: line(160),
    /** What to do about it: "Let the engine cool below 50 °C before you loosen the cover." */
    avoid: line(240),
  })
  .strict();

export const Timer = z
  .object({ key: Key, name: line(90), kind: z.enum(TIMER_KINDS), minutes, note: line(160).optional() })
  .strict();

export const Figure = z
  .object({
    key: Key,
    /** A drawing in `public/figures`. */
    file: z
      .string()
      .regex(/^[a-z0-9]+(-[a-z0-9]+)*\.svg$/, 'must be the name of a drawing, for example cover-underside.svg'),
    /** What the drawing shows, for somebody who cannot see it. */
    alt: line(300),
    caption: line(160),
  })
  .strict();

export const Source = z
  .object({ key: Key, kind: z.enum(SOURCE_KINDS), title: line(160), detail: line(240).optional() })
  .strict();

const list = <T extends z.ZodTypeAny>(item: T, max: number) =>
  z.array(item).max(max, `must have ${max} entries or fewer`).default([]);

export const FrontmatterFields = z
  .object({
    title: line(90),
    summary: line(300),
    system: z.enum(SYSTEM_KEYS),
    /** Keys of `content/engines`, for example tarn-t18f. */
    engines: z.array(Key).min(1, 'must name at least one engine').max(20),
    /** Bench time in minutes for the person it is written for. */
    minutes: z.number().int('must be a whole number').min(1).max(10_000),
    skill: z.enum(SKILLS),
    /** A mistake here can hurt somebody or destroy an engine: every change needs two editors. */
    critical: z.boolean().default(false),
    parts: list(Part, 60),
    tools: list(Tool, 40),
    supplies: list(Supply, 30),
    torques: list(Torque, 40),
    limits: list(Limit, 60),
    cautions: list(Caution, 30),
    timers: list(Timer, 30),
    figures: list(Figure, 20),
    sources: list(Source, 20),
  })
  .strict();

/** The lists of a front matter whose entries the body points at by key. */
export const KEYED_LISTS = [
  'parts',
  'tools',
  'supplies',
  'torques',
  'limits',
  'cautions',
  'timers',
  'figures',
  'sources',
] as const;

export const Frontmatter = FrontmatterFields.superRefine((f, ctx) => {
  for (const name of KEYED_LISTS) {
    const seen = new Set<string>();
    f[name].forEach((entry, i) => {
      if (seen.has(entry.key))
        ctx.addIssue({
          code: 'custom',
          path: [name, i, 'key'],
          message: `"${entry.key}" is used twice in ${name}; give each entry its own key`,
        });
      seen.add(entry.key);
    });
  }
  const sources = new Set(f.sources.map((s) => s.key));
  for (const name of ['torques', 'limits'] as const)
    f[name].forEach((entry, i) => {
      if (entry.source && !sources.has(entry.source))
        ctx.addIssue({
          code: 'custom',
          path: [name, i, 'source'],
          message: `points at source "${entry.source}", which is not in sources`,
        });
    });
});

export type Part = z.infer<typeof Part>;
export type Tool = z.infer<typeof Tool>;
export type Supply = z.infer<typeof Supply>;
export type Torque = z.infer<typeof Torque>;
export type Limit = z.infer<typeof Limit>;
export type Caution = z.infer<typeof Caution>;
export type Timer = z.infer<typeof Timer>;
export type Figure = z.infer<typeof Figure>;
export type Source = z.infer<typeof Source>;
export type Frontmatter = z.infer<typeof Frontmatter>;
export type FrontmatterInput = z.input<typeof Frontmatter>;
