import { z } from 'zod';
import { RevisionLetter } from './common';

/** A draft and what was published meanwhile, brought together. The OpenAPI document is made from these schemas. */

const Said = z.string().nullable();

const MergeConflict = z.object({
  path: z.string().describe('`minutes`, `torques.cover-bolt`, `steps.draw-down.body`, `intro`, `order.steps`'),
  kind: z.enum(['field', 'entry', 'step', 'text', 'order', 'cautions']),
  reason: z.enum(['both', 'added', 'mineRemoved', 'theirsRemoved', 'order', 'reference']),
  label: z.string(),
  base: z.unknown(),
  mine: z.unknown(),
  theirs: z.unknown(),
  says: z.object({ base: Said, mine: Said, theirs: Said }).describe('The three as a person reads them'),
});

export const ProposalMerge = z.object({
  from: RevisionLetter.nullable().describe('What the draft stands on; null for a new procedure'),
  to: RevisionLetter.nullable().describe('What is published now'),
  clean: z.boolean().describe('True where nothing has to be asked and the merged text can be read'),
  source: z.string().nullable().describe('The merged text in canonical form, where it is clean'),
  conflicts: z.array(MergeConflict),
});
export type ProposalMerge = z.infer<typeof ProposalMerge>;
