import type { ProposalMerge } from '@/domain/api/schemas/merge';
import type { Actor } from '@/domain/people/may';
import { toSource } from '@/domain/procedure/canonical';
import { merge } from '@/domain/revision/merge';
import { acceptedProcedure } from '../book/compare';
import { parsedText } from '../book/parsed';
import { readSheet } from '../book/sheet';
import { refuseUnreadable } from './draftText';
import { guard, readableProposal } from './guard';

/**
 * The author's draft brought together with the revision that is published now; changes nothing. Where the base is still
 * current, that is the draft itself. Refuses 404 and 403 as an edit does, 422 a draft that cannot be read yet.
 */
export async function mergeProposal(actor: Actor, id: string): Promise<ProposalMerge> {
  const proposal = await readableProposal(actor, id);
  guard({ act: 'edit' }, actor, proposal, null);
  const { number, base: from, current: to } = proposal;
  const parsed = await parsedText(proposal.source);
  refuseUnreadable(parsed);
  if (from === null || to === null || from === to)
    return { from, to, clean: true, source: parsed.canonical, conflicts: [] };
  const published = async (letter: string) => acceptedProcedure((await readSheet(actor, number, letter)).source);
  const { procedure, conflicts } = merge(await published(from), parsed.procedure, await published(to));
  const merged = conflicts.length === 0 ? await parsedText(toSource(procedure)) : null;
  const source = merged?.ok ? merged.canonical : null;
  return { from, to, clean: source !== null, source, conflicts };
}
