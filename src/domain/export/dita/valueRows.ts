import { capital, listed } from '@/domain/wording';
import type { Frontmatter, Limit, Torque } from '../../procedure/schema';
import type { Reference } from '../../procedure/types';
import { durationText, limitText, threadText, torqueText } from '../../procedure/values';
import { bothWords } from './nodes';

/** Value, what it is worked to, the state it holds in, where it comes from: no number stands without the others. */
export const VALUE_COLUMNS = ['Value', 'Work to', 'State', 'Origin'] as const;

type Row = readonly [name: string, to: string, state: string, origin: string];

const sentences = (parts: readonly (string | undefined)[]): string =>
  parts.flatMap((part) => (part ? [capital(/[.!?]$/.test(part) ? part : `${part}.`)] : [])).join(' ');

const origin = (source: string | undefined, f: Frontmatter): string =>
  f.sources.find(({ key }) => key === source)?.title ?? 'No source stated';

const places = ({ positions = [] }: Torque): string | undefined =>
  positions.length === 0
    ? undefined
    : `Places seen from the heads, right and down in mm: ${positions.map(([x, y], i) => `${i + 1} (${x}, ${y})`).join(', ')}`;

export function torqueRow(torque: Torque, f: Frontmatter): Row {
  const passes = (torque.passes ?? []).map(
    (_, i) => `Pass ${i + 1}: ${bothWords(torqueText(torque, { pass: i + 1 }))}`,
  );
  const to = [...passes, `${passes.length ? 'Final: ' : ''}${bothWords(torqueText(torque))}`].join('; ');
  const order = torque.order && `Order of the places: ${listed(torque.order)}`;
  const count = `${torque.count} ${torque.count === 1 ? 'place' : 'places'}`;
  const state = sentences([`${threadText(torque)}, ${count}`, order, places(torque), torque.note]);
  return [torque.name, to, state, origin(torque.source, f)];
}

export const limitRow = (limit: Limit, f: Frontmatter): Row => [
  limit.name,
  bothWords(limitText(limit)),
  sentences([limit.condition ?? 'As the step says', limit.note]),
  origin(limit.source, f),
];

const timeRow = (name: string, minutes: number, note?: string): Row => [
  name,
  durationText(minutes),
  sentences([note ?? 'As the step says']),
  'Stated by this sheet',
];

/** Each time of the sheet: its timers, and how long its supplies take to skin over and to cure. */
export const timeRows = (f: Frontmatter): Row[] => [
  ...f.timers.map(({ name, minutes, note }) => timeRow(name, minutes, note)),
  ...f.supplies.flatMap(({ name, skinOver, cure }) => [
    ...(skinOver === undefined ? [] : [timeRow(`${name}, skins over`, skinOver)]),
    ...(cure === undefined ? [] : [timeRow(`${name}, full cure`, cure)]),
  ]),
];

/** What a step works to, each value once, in the order first used. */
export function stepRows(references: readonly Reference[], f: Frontmatter): Row[] {
  const seen = new Set<string>();
  return references.flatMap((reference): Row[] => {
    if (reference.kind !== 'torque' && reference.kind !== 'limit') return [];
    const id = `${reference.kind}:${reference.key}`;
    if (seen.has(id)) return [];
    seen.add(id);
    const torque = reference.kind === 'torque' && f.torques.find(({ key }) => key === reference.key);
    const limit = reference.kind === 'limit' && f.limits.find(({ key }) => key === reference.key);
    return [...(torque ? [torqueRow(torque, f)] : []), ...(limit ? [limitRow(limit, f)] : [])];
  });
}
