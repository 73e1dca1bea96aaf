import { UNIFIED_SERIES, inchesOf } from './inchThreads';
import { formatNumber } from './format';
import { type FieldProblem, type Worked, numberProblem, refused, worked } from './worked';

/** A thread that clamps: its nominal diameter and pitch in m. */
export interface ScrewThread {
  kind: 'metric' | 'unified';
  /** As it is said at the bench: "M8 × 1.25", "1/4-20 UNC". */
  name: string;
  diameter: number;
  pitch: number;
  /** Where the pitch was not written: a metric thread without one is coarse by ISO 965-1. */
  assumedCoarse: boolean;
}

/**
 * A pipe thread (ISO 228-1, ISO 7-1). Its size is a name, not a measure, and its torque makes a seal: T = K·d·F
 * does not speak about it.
 */
export interface PipeThread {
  kind: 'pipe';
  name: string;
}

export type ThreadRead = ScrewThread | PipeThread;

/** Why a pipe thread has no clamp load, for the screen. */
export const NO_CLAMP_IN_PIPE =
  'A pipe thread is tightened until it seals; it does not clamp, so no clamp load can be given.';

/**
 * Coarse pitch in mm by nominal diameter in mm, M3 to M36. Source: ISO 261 and ISO 262, as quoted in
 * secondary tables; M3.5, M7, M9 and M11 from memory.
 */
export const COARSE_PITCH: Readonly<Record<number, number>> = {
  3: 0.5,
  3.5: 0.6,
  4: 0.7,
  5: 0.8,
  6: 1,
  7: 1,
  8: 1.25,
  9: 1.25,
  10: 1.5,
  11: 1.5,
  12: 1.75,
  14: 2,
  16: 2,
  18: 2.5,
  20: 2.5,
  22: 2.5,
  24: 3,
  27: 3,
  30: 3.5,
  33: 3.5,
  36: 4,
};

const METRIC = /^M(\d{1,2}(?:\.\d)?)$/;
const UNIFIED = /^(#\d{1,2}|\d{1,2}\/\d{1,2}|\d)-(\d{1,2}) UN([CF])$/;
const PIPE = /^[RG]p? ?\d{1,2}(?:\/\d{1,2})?$/;

const because = (field: string, message: string) => refused({ field, message });

function metric(text: string, size: string, pitch: number | undefined): Worked<ThreadRead> {
  const diameter = Number(size);
  if (diameter <= 0) return because('thread', 'The thread must have a diameter of more than zero.');
  const coarse = COARSE_PITCH[diameter];
  const used = pitch ?? coarse;
  if (used === undefined)
    return because('pitch', `The pitch is missing, and the book holds no coarse pitch for ${text}; give it in mm.`);
  const problems = numberProblem('pitch', 'The pitch', used, { above: 0 });
  if (problems.length > 0) return refused(...problems);
  // No series has a pitch of more than a quarter of the diameter (M1 × 0.25); a third leaves room for old ones.
  if (used > diameter / 3)
    return because('pitch', `A pitch of ${formatNumber(used)} mm is too coarse for ${text}; look at it with a gauge.`);
  return worked({
    kind: 'metric',
    name: `${text} × ${formatNumber(used)}`,
    diameter: diameter / 1000,
    pitch: used / 1000,
    assumedCoarse: pitch === undefined,
  });
}

function unified(text: string, size: string, perInch: number, letter: string): Worked<ThreadRead> {
  const series = UNIFIED_SERIES[size];
  if (!series) return because('thread', `${size} is no size of the unified coarse or fine series.`);
  const wanted = series[letter === 'C' ? 0 : 1];
  if (wanted === null) return because('thread', `${size} is not made as UN${letter}.`);
  if (wanted !== perInch)
    return because('thread', `${size} UN${letter} has ${wanted} threads to the inch, not ${perInch}.`);
  return worked({
    kind: 'unified',
    name: text,
    diameter: inchesOf(size) * 0.0254,
    pitch: 0.0254 / perInch,
    assumedCoarse: false,
  });
}

/**
 * Reads a thread as the schema's `Thread` writes it: `M6`, `#10-32 UNF`, `1/4-20 UNC`, `G 1/4`.
 *
 * @param text the thread; spaces around it do not count
 * @param pitch of a metric thread in mm, as a sheet keeps it; the coarse pitch where left out
 * @returns diameter and pitch in m; problems name `thread` or `pitch`: a text that is no thread, an inch size with a
 *   number of threads that its series does not have, a pitch that is missing, impossible or given for an inch thread
 */
export function readThread(text: string, pitch?: number): Worked<ThreadRead> {
  const name = typeof text === 'string' ? text.trim() : '';
  const [, size] = METRIC.exec(name) ?? [];
  if (size !== undefined) return metric(name, size, pitch);
  const misplaced: FieldProblem[] =
    pitch === undefined ? [] : [{ field: 'pitch', message: 'A pitch in mm belongs to metric threads only.' }];
  const [, inches, perInch, letter] = UNIFIED.exec(name) ?? [];
  if (inches !== undefined && perInch !== undefined && letter !== undefined)
    return misplaced.length > 0 ? refused(...misplaced) : unified(name, inches, Number(perInch), letter);
  if (PIPE.test(name)) return misplaced.length > 0 ? refused(...misplaced) : worked({ kind: 'pipe', name });
  return because(
    'thread',
    name === ''
      ? 'The thread is missing; write it as M6, 1/4-20 UNC or G 1/4.'
      : `"${name.slice(0, 40)}" is no thread that the book reads; write it as M6, 1/4-20 UNC or G 1/4.`,
  );
}
