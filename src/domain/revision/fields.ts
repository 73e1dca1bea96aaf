import { convert, isUnit, type Unit } from '../measure/convert';
import { formatNumber, withUnit } from '../measure/format';
import { type Frontmatter, type KEYED_LISTS, type Limit, SYSTEMS, type Torque } from '../procedure/schema';
import { durationText, limitText, threadText, torqueText } from '../procedure/values';
import { passWords } from './bodyText';

/** A front matter flattened into the values that a reviewer compares, each with its name and its text. */

export type ListName = (typeof KEYED_LISTS)[number];
export type Entry = Frontmatter[ListName][number];

export interface Field {
  /** Behind the entry's own path: `nm`, `passes.0`. */
  path: string;
  /** Behind the entry's name: "tolerance", "first pass"; empty for the value that the entry is about. */
  words: string;
  text: string;
  /** The stored value, to the last digit: what decides whether it changed. */
  raw: string;
  /** Where it is one number on a scale from zero. */
  number: { value: number; unit: Unit | null } | null;
}

type Cell = [words: string, text: (value: never, entry: never) => string, number?: 'number'];
const TURNS = ['first turn', 'second turn', 'third turn', 'fourth turn'];

const plain = (value: unknown) => String(value);
const unitOf = (limit: Limit): Unit | null => (limit.unit !== undefined && isUnit(limit.unit) ? limit.unit : null);
const inUnit = (value: number, unit: Unit | null) => (unit ? withUnit(formatNumber(value), unit) : formatNumber(value));
const measured = (value: number, limit: Limit) => inUnit(value, unitOf(limit));
const mm = (value: number) => inUnit(value, 'mm');
const newtonMetres = (value: number) => inUnit(value, 'N·m');
const places = (value: NonNullable<Torque['positions']>) =>
  value.map(([x, y], i) => `${i + 1} at ${formatNumber(x)}, ${formatNumber(y)}`).join('; ');
const minutesText = (value: number) => durationText(value);

/** What each field is called and how its value reads. A field that is not named here is shown as it is stored. */
const CELLS: Record<ListName | 'head', Record<string, Cell>> = {
  head: {
    title: ['Title', plain],
    summary: ['Summary', plain],
    system: ['System', (value: keyof typeof SYSTEMS) => SYSTEMS[value]],
    engines: ['Engines', (value: string[]) => value.join(', ')],
    minutes: ['Bench time', minutesText, 'number'],
    skill: ['Written for', (value: string) => (value === 'senior' ? 'senior technician' : value)],
    critical: ['Critical sheet', (value: boolean) => (value ? 'yes' : 'no')],
  },
  parts: {
    quantity: ['quantity', plain, 'number'],
    action: ['what happens to it', plain],
    number: ['part number', plain],
  },
  tools: {},
  supplies: {
    skinOver: ['skin-over time', minutesText, 'number'],
    cure: ['cure time', minutesText, 'number'],
  },
  torques: {
    pitch: ['pitch', mm, 'number'],
    length: ['length', mm, 'number'],
    class: ['property class', plain],
    nm: ['', newtonMetres, 'number'],
    tolerance: ['tolerance', (value: number) => `±${newtonMetres(value)}`, 'number'],
    angleTolerance: ['tolerance of the turns', (value: number) => `±${formatNumber(value)}°`, 'number'],
    count: ['how many', plain, 'number'],
    positions: ['places', places],
    order: ['tightening order', (value: number[]) => value.join(' ')],
  },
  limits: {
    min: ['least', measured, 'number'],
    max: ['most', measured, 'number'],
    nominal: ['nominal', measured, 'number'],
    resolution: ['tool resolution', measured, 'number'],
    expect: ['', plain],
  },
  cautions: {
    signal: ['signal word', plain],
    hazard: ['', plain],
    avoid: ['how to avoid', plain],
  },
  timers: { minutes: ['', minutesText, 'number'] },
  figures: { file: ['drawing', plain], alt: ['description', plain] },
  sources: {},
};

/** The unit that a field's number stands in, so that 0.8 mm and 31 thou can be set against each other. */
function unitFor(list: ListName | 'head', name: string, entry: object): Unit | null {
  if (list === 'limits') return unitOf(entry as Limit);
  if (list === 'torques' && (name === 'nm' || name === 'tolerance' || name === 'passes')) return 'N·m';
  return null;
}

/** Numbers that are written in another unit are other texts, though the digits are the same. */
const rawOf = (value: unknown, unit: Unit | null) => JSON.stringify([value, typeof value === 'number' ? unit : null]);

/**
 * The fields of one entry, or of the head, that are set: as in the canonical text, `false` and an empty list are not.
 * Keys are left out, because they name the entry.
 */
export function fieldsOf(list: ListName | 'head', entry: object): Field[] {
  return Object.entries(entry).flatMap(([name, value]): Field[] => {
    if (name === 'key' || value === undefined || value === false) return [];
    if (Array.isArray(value) && value.length === 0) return [];
    const unit = unitFor(list, name, entry);
    const steps = list === 'torques' && Array.isArray(value) && (name === 'passes' || name === 'angles');
    if (steps)
      return (value as number[]).map((step, i) => ({
        path: `${name}.${i}`,
        words: name === 'passes' ? passWords(i + 1) : (TURNS[i] ?? `turn ${i + 1}`),
        text: name === 'passes' ? newtonMetres(step) : `${formatNumber(step)}°`,
        raw: rawOf(step, unit),
        number: { value: step, unit },
      }));
    const cell = CELLS[list][name];
    const [words, text, number] = cell ?? [name, plain];
    return [
      {
        path: name,
        words,
        text: (text as (value: unknown, entry: object) => string)(value, entry),
        raw: rawOf(value, unit),
        number: number && typeof value === 'number' ? { value, unit } : null,
      },
    ];
  });
}

/** The change of one number in per cent of the old, to a tenth; null from zero, and for temperatures, which have no zero of use. */
export function percentChange(from: Field | undefined, to: Field | undefined): number | null {
  const [a, b] = [from?.number, to?.number];
  if (!a || !b || a.value === 0) return null;
  if (a.unit === '°C' || a.unit === '°F') return null;
  if (a.unit !== b.unit && (!a.unit || !b.unit)) return null;
  const like = a.unit && b.unit ? convert(b.value, b.unit, a.unit) : ({ ok: true, value: b.value } as const);
  if (!like.ok) return null;
  const percent = Math.round(((like.value - a.value) / Math.abs(a.value)) * 1000) / 10;
  return Number.isFinite(percent) ? percent + 0 : null;
}

type Of<L extends ListName> = Frontmatter[L][number];

/** What an entry is called at the bench. */
export function nameOf<L extends ListName>(list: L, entry: Of<L>): string {
  const e = entry as Partial<Record<'name' | 'hazard' | 'caption' | 'title', string>> & { key: string };
  const name = list === 'cautions' ? e.hazard : list === 'figures' ? e.caption : list === 'sources' ? e.title : e.name;
  return name ?? e.key;
}

/** What an entry stands on, told beside it: the fastener, the state it is measured in, the part number. */
export const detailOf: { [L in ListName]: (entry: Of<L>) => string | null } = {
  parts: (part) => part.number ?? null,
  tools: (tool) => tool.range ?? null,
  supplies: () => null,
  torques: threadText,
  limits: (limit) => limit.condition ?? null,
  cautions: (caution) => caution.signal,
  timers: (timer) => timer.kind,
  figures: (figure) => figure.file,
  sources: (source) => source.kind,
};

/** A whole entry in one line, for one that comes or goes. */
export const wholeOf: { [L in ListName]: (entry: Of<L>) => string } = {
  parts: (part) => `${part.quantity}, ${part.action}`,
  tools: (tool) => [tool.name, tool.range].filter(Boolean).join(', '),
  supplies: (supply) =>
    [
      supply.name,
      supply.skinOver === undefined ? '' : `skins over in ${durationText(supply.skinOver)}`,
      supply.cure === undefined ? '' : `cures in ${durationText(supply.cure)}`,
    ]
      .filter(Boolean)
      .join(', '),
  torques: (torque) => torqueText(torque).metric,
  limits: (limit) => limitText(limit).metric,
  cautions: (caution) => `${caution.signal}: ${caution.hazard}; ${caution.harm}. ${caution.avoid}`,
  timers: (timer) => durationText(timer.minutes),
  figures: (figure) => figure.caption,
  sources: (source) => [source.title, source.detail].filter(Boolean).join('. '),
};
