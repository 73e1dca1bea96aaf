import type { Sheet } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import type { RenderedProcedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import type { Comparison } from '@/domain/revision/types';
import { acceptedProcedure } from '../book/compare';
import { parsedText } from '../book/parsed';
import { readSheet } from '../book/sheet';
import { refuseUnreadable } from './draftText';
import { readableProposal } from './guard';

export interface ComparedProposal {
  /** The sheet that the text stands on; null for a new procedure. */
  base: Sheet | null;
  proposed: RenderedProcedure;
  comparison: Comparison;
}

/** What a proposal changes against its base. Refuses 422, with line and column, a draft that cannot be read yet. */
export async function compareProposal(actor: Actor, id: string): Promise<ComparedProposal> {
  const proposal = await readableProposal(actor, id);
  const parsed = await parsedText(proposal.source);
  refuseUnreadable(parsed);
  const base = proposal.base === null ? null : await readSheet(actor, proposal.number, proposal.base);
  const before = base && (await acceptedProcedure(base.source));
  return { base, proposed: parsed.rendered, comparison: compareProcedures(before, parsed.procedure) };
}
