import type { RevisionHead } from '@db/models/book';
import type { RenderedProcedure } from '@/domain/procedure/types';

/** What lists show of a text. */
export function headOf({ frontmatter, steps }: RenderedProcedure): RevisionHead {
  const { title, summary, system, engines, minutes, skill, critical } = frontmatter;
  const holds = steps.reduce((sum, step) => sum + step.holds.length, 0);
  return { title, summary, system, engines, minutes, skill, critical, holds };
}
