import { clampOf } from '../procedure/clamp';
import type { Frontmatter } from '../procedure/schema';
import { clampChanges } from './clampChanges';

/** A torque that would load its bolt past proof. */
export interface FailingTorque {
  key: string;
  name: string;
  /** Clamp load over proof load, more than 1: 1.23 is 123 %. */
  share: number;
}

/**
 * The torques that fail the clamp check and that somebody must answer for before the text is published: those past proof
 * load that are new or whose load changes against the base, and every such torque of a new sheet (`from` is null). One
 * that stood there before with the same load does not count again: its reason is in the history already, and a mend of
 * some other line must not wait for it. What a torque is called is no part of its load, its key is: under another key it
 * counts as new.
 */
export function failingTorques(from: Frontmatter | null, to: Frontmatter): FailingTorque[] {
  const over = new Set(clampChanges(from, to).flatMap(({ key, verdict }) => (verdict === 'over' ? [key] : [])));
  return to.torques.flatMap((torque): FailingTorque[] => {
    const share = over.has(torque.key) ? clampOf(torque)?.share : null;
    return typeof share === 'number' ? [{ key: torque.key, name: torque.name, share }] : [];
  });
}
