import type { BothUnits } from '@/domain/measure/format';
import type { Torque } from '@/domain/procedure/schema';
import { torqueText } from '@/domain/procedure/values';
import { passWord } from './words';

/** One round over all bolts: what it is called and what each bolt gets. */
export interface Round {
  name: string;
  text: BothUnits;
}

/**
 * The rounds over the bolts that a step asks for: the passes it names, and with `final` all of them, the final torque and
 * each turn after it.
 */
export function roundsOf(torque: Torque, { passes, final }: { passes: readonly number[]; final: boolean }): Round[] {
  const all = (torque.passes ?? []).map((_, i) => i + 1);
  const rounds = (final ? all : passes).map((pass) => ({ name: passWord(pass), text: torqueText(torque, { pass }) }));
  if (!final) return rounds;
  const { angles = [], ...alone } = torque;
  const turns = angles.map((angle, i) => ({
    name: angles.length > 1 ? `Turn ${i + 1}` : 'Turn',
    text: { metric: `${angle}°`, inch: `${angle}°` },
  }));
  return [...rounds, { name: all.length > 0 ? 'Final pass' : 'Torque', text: torqueText(alone) }, ...turns];
}
