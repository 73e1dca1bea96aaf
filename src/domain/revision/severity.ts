import type { Effect } from './effect';
import type { ClampChange, Severity } from './types';

/**
 * How grave a change is: grave where it can hurt somebody or lose an engine if it is a mistake; serious where it is
 * critical otherwise; ordinary else. It orders the desk. How many must agree goes by the critical reasons alone, and
 * whatever is grave is critical.
 */

/** Gravest first. */
const ORDER: readonly Effect['kind'][] = [
  'past-proof',
  'unit-mix-up',
  'caution-removed',
  'caution-weaker',
  'hold-dropped',
  'limit-wider',
  'limit-moved',
  'part-reused',
];

/** What the clamp load of a new or changed torque makes grave. */
export const clampReasons = ({ name, verdict, mixUps }: Pick<ClampChange, 'name' | 'verdict' | 'mixUps'>) => [
  ...(verdict === 'over' ? [{ kind: 'past-proof' as const, grave: `“${name}” is tightened past its proof load` }] : []),
  ...(mixUps.length > 0 ? [{ kind: 'unit-mix-up' as const, grave: `“${name}” looks like a mix-up of units` }] : []),
];

/** "a torque changes: Cover bolt" as it reads behind a colon: "a torque changes (Cover bolt)". */
const named = (reason: string) => reason.replace(/: (.+)$/, ' ($1)');

/**
 * @param criticalReasons most serious first; empty for an ordinary change
 */
export function severityOf(
  effects: readonly Pick<Effect, 'kind' | 'grave'>[],
  clamp: readonly ClampChange[],
  criticalReasons: readonly string[],
): Severity {
  const grave = [...clamp.flatMap(clampReasons), ...effects]
    .filter((one): one is { kind: Effect['kind']; grave: string } => one.grave !== null)
    .sort((a, b) => ORDER.indexOf(a.kind) - ORDER.indexOf(b.kind));
  if (grave.length > 0) return { level: 'grave', because: [...new Set(grave.map((one) => one.grave))] };
  return criticalReasons.length > 0
    ? { level: 'serious', because: criticalReasons.map(named) }
    : { level: 'ordinary', because: [] };
}
