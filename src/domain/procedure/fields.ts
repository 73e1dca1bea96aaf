import type { Caution, Figure, Frontmatter, Limit, Part, Source, Supply, Timer, Tool, Torque } from './schema';

/**
 * Every field of the front matter: its order in the written text and its name in words. Types only
 * come from the schema, so this stays light enough for the browser; the compiler sees to it that no
 * field is missing here.
 */
export const HEAD_FIELDS = {
  title: 'title',
  summary: 'summary',
  system: 'system',
  engines: 'engines',
  minutes: 'bench time',
  skill: 'skill',
  critical: 'critical',
  parts: 'parts',
  tools: 'tools',
  supplies: 'supplies',
  torques: 'torques',
  limits: 'limits',
  cautions: 'cautions',
  timers: 'timers',
  figures: 'figures',
  sources: 'sources',
} as const satisfies Record<keyof Frontmatter, string>;

const parts = {
  key: 'key',
  name: 'name',
  number: 'part number',
  quantity: 'quantity',
  action: 'action',
  note: 'note',
} satisfies Record<keyof Part, string>;

const tools = { key: 'key', name: 'name', range: 'range', note: 'note' } satisfies Record<keyof Tool, string>;

const supplies = {
  key: 'key',
  name: 'name',
  note: 'note',
  skinOver: 'skin-over time',
  cure: 'cure time',
} satisfies Record<keyof Supply, string>;

const torques = {
  key: 'key',
  name: 'name',
  thread: 'thread',
  pitch: 'pitch',
  length: 'length',
  class: 'property class',
  condition: 'condition',
  nm: 'torque in N·m',
  tolerance: 'tolerance',
  passes: 'passes',
  angles: 'angles',
  angleTolerance: 'angle tolerance',
  count: 'number of bolts',
  positions: 'positions',
  order: 'order',
  source: 'source',
  note: 'note',
} satisfies Record<keyof Torque, string>;

const limits = {
  key: 'key',
  name: 'name',
  quantity: 'quantity',
  unit: 'unit',
  min: 'minimum',
  max: 'maximum',
  nominal: 'nominal',
  resolution: 'tool resolution',
  condition: 'condition',
  expect: 'expected finding',
  source: 'source',
  note: 'note',
} satisfies Record<keyof Limit, string>;

const cautions = {
  key: 'key',
  signal: 'signal word',
  hazard: 'hazard',
  harm: 'harm',
  avoid: 'how to avoid it',
} satisfies Record<keyof Caution, string>;

const timers = {
  key: 'key',
  name: 'name',
  kind: 'kind',
  minutes: 'time in minutes',
  note: 'note',
} satisfies Record<keyof Timer, string>;

const figures = {
  key: 'key',
  file: 'file',
  alt: 'description',
  caption: 'caption',
} satisfies Record<keyof Figure, string>;

const sources = { key: 'key', kind: 'kind', title: 'title', detail: 'detail' } satisfies Record<keyof Source, string>;

/** Fields of the entries of each list, in the order in which they are written. */
export const ENTRY_FIELDS = { parts, tools, supplies, torques, limits, cautions, timers, figures, sources } as const;
export type ListName = keyof typeof ENTRY_FIELDS;

/** One entry of a list, in words: "Torque 2". */
export const ENTRY_WORDS: Record<ListName, string> = {
  parts: 'Part',
  tools: 'Tool',
  supplies: 'Supply',
  torques: 'Torque',
  limits: 'Limit',
  cautions: 'Caution',
  timers: 'Timer',
  figures: 'Figure',
  sources: 'Source',
};

export const isListName = (name: unknown): name is ListName =>
  typeof name === 'string' && Object.hasOwn(ENTRY_FIELDS, name);
