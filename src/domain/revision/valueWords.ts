import type { ListName } from './fields';
import type { ValueChange } from './types';
import { LONGEST_VALUE } from './valueRows';

const ENTRIES: Record<ListName, string> = {
  parts: 'part',
  tools: 'tool',
  supplies: 'supply',
  torques: 'torque',
  limits: 'limit',
  cautions: 'caution',
  timers: 'time',
  figures: 'drawing',
  sources: 'source',
};

/** "10 to 12 N·m": a unit that two single numbers share is said once. */
function span(from: string, to: string): string {
  const unitOf = (text: string) => /^[±−-]?\d[\d.]*(\D+)$/.exec(text)?.[1];
  const unit = unitOf(to);
  return `${unit !== undefined && unit === unitOf(from) ? from.slice(0, -unit.length) : from} to ${to}`;
}

/** A changed value in a few words: "Cover bolt torque, 10 to 12 N·m"; long texts are named, not repeated. */
export function valueWords({ list, key, path, kind, label, from, to }: ValueChange): string {
  const whole = list !== 'head' && path === `${list}.${key ?? ''}`;
  if (whole) return `${label} (${ENTRIES[list]}), ${kind}`;
  const name = list === 'torques' && path.endsWith('.nm') ? `${label} torque` : label;
  if (from === null || to === null) return `${name}, ${kind}`;
  // Engines stand in a text by their keys, which nobody reads.
  const told = path !== 'engines' && Math.max(from.length, to.length) <= LONGEST_VALUE;
  return !told ? name : `${name}, ${span(from, to)}`;
}
