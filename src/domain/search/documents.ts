import type { MeasuredQuantity } from '../measure/quantities';
import type { Limit, System, Torque } from '../procedure/schema';
import type { Reference, RenderedProcedure } from '../procedure/types';

/**
 * What of a published sheet is searched on the reader's own machine: names and values, no prose. It is small
 * enough to be sent whole, and holds all that a row of the list shows.
 */
export interface SearchDocument {
  number: string;
  letter: string;
  /** ISO 8601, UTC. */
  publishedAt: string;
  /** "Common book" or the name of the shop. */
  book: string;
  /** Nobody works from it now; said on its row, and it stands last. */
  withdrawn?: true;
  title: string;
  summary: string;
  system: System;
  /** Keys of `content/engines`. */
  engines: string[];
  minutes: number;
  skill: RenderedProcedure['frontmatter']['skill'];
  holds: number;
  steps: string[];
  tools: string[];
  parts: SearchPart[];
  torques: SearchTorque[];
  limits: SearchLimit[];
  timers: SearchTimer[];
}

export interface SearchPart {
  name: string;
  number: string | null;
}

/** Torques in N·m, angles in degrees. `step` is the first step that uses it, from 1; null where none does. */
export interface SearchTorque {
  name: string;
  /** "M6×1.0" or "1/4-20 UNC". */
  thread: string;
  nm: number;
  passes: number[];
  angles: number[];
  count: number;
  step: number | null;
}

/** A limit with numbers, in `unit`; one without (a finding) has no unit and only its name is searched. */
export interface SearchLimit {
  name: string;
  quantity: MeasuredQuantity | 'finding';
  unit: string | null;
  min: number | null;
  nominal: number | null;
  max: number | null;
  /** Of the tool it is read with, in `unit`; values are shown to it. */
  resolution: number | null;
  step: number | null;
}

export interface SearchTimer {
  name: string;
  minutes: number;
  step: number | null;
}

export interface SearchMeta {
  number: string;
  letter: string;
  publishedAt: string;
  book: string;
}

/** "M6×1.0": a pitch is said with at least one decimal. */
export function threadName(torque: Pick<Torque, 'thread' | 'pitch'>): string {
  if (torque.pitch === undefined) return torque.thread;
  return `${torque.thread}×${Number.isInteger(torque.pitch) ? torque.pitch.toFixed(1) : String(torque.pitch)}`;
}

const points = (reference: Reference, kind: 'torque' | 'limit' | 'timer', key: string): boolean => {
  if (reference.kind === 'worksheet') return kind === 'limit' && reference.keys.includes(key);
  return reference.kind === kind && reference.key === key;
};

function limitOf(limit: Limit, step: number | null): SearchLimit {
  const { name, quantity, unit = null, min = null, nominal = null, max = null, resolution = null } = limit;
  return { name, quantity, unit, min, nominal, max, resolution, step };
}

/** The search document of a published revision. */
export function searchDocument(rendered: RenderedProcedure, meta: SearchMeta): SearchDocument {
  const { frontmatter: f, steps } = rendered;
  const stepOf = (kind: 'torque' | 'limit' | 'timer', key: string): number | null =>
    steps.find((step) => step.references.some((reference) => points(reference, kind, key)))?.number ?? null;
  return {
    ...meta,
    title: f.title,
    summary: f.summary,
    system: f.system,
    engines: f.engines,
    minutes: f.minutes,
    skill: f.skill,
    holds: steps.reduce((sum, step) => sum + step.holds.length, 0),
    steps: steps.map((step) => step.title),
    tools: [...f.tools, ...f.supplies].map((thing) => thing.name),
    parts: f.parts.map((part) => ({ name: part.name, number: part.number ?? null })),
    torques: f.torques.map((torque) => ({
      name: torque.name,
      thread: threadName(torque),
      nm: torque.nm,
      passes: torque.passes ?? [],
      angles: torque.angles ?? [],
      count: torque.count,
      step: stepOf('torque', torque.key),
    })),
    limits: f.limits.map((limit) => limitOf(limit, stepOf('limit', limit.key))),
    timers: [
      ...f.timers.map((timer) => ({ name: timer.name, minutes: timer.minutes, step: stepOf('timer', timer.key) })),
      ...f.supplies.flatMap((supply) =>
        (
          [
            ['skins over', supply.skinOver],
            ['cures', supply.cure],
          ] as const
        ).flatMap(([what, minutes]) =>
          minutes === undefined ? [] : [{ name: `${supply.name} ${what}`, minutes, step: stepOf('timer', supply.key) }],
        ),
      ),
    ],
  };
}
