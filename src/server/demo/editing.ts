import type { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';

type Keyed = 'parts' | 'tools' | 'torques' | 'limits' | 'timers';

/** The entry of a list with that key. Throws where a sheet no longer has it, so that a chapter is mended with it. */
export function entry<L extends Keyed>({ frontmatter }: Procedure, list: L, key: string): Frontmatter[L][number] {
  const found = (frontmatter[list] as { key: string }[]).find((one) => one.key === key);
  if (!found) throw new Error(`${frontmatter.title} has no ${key} in its ${list}.`);
  return found as Frontmatter[L][number];
}

/** The place of a step. Throws where the sheet has no such step. */
export function stepIndex({ frontmatter, steps }: Procedure, id: string): number {
  const index = steps.findIndex((step) => step.id === id);
  if (index < 0) throw new Error(`${frontmatter.title} has no step ${id}.`);
  return index;
}
