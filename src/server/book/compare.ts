import type { RevisionSummary, Sheet } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import type { Procedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import type { Comparison } from '@/domain/revision/types';
import { parsedText } from './parsed';
import { readSheet } from './sheet';

export interface ComparedRevisions {
  from: RevisionSummary;
  to: RevisionSummary;
  comparison: Comparison;
  fromSheet: Sheet;
  toSheet: Sheet;
}

/** A text that was accepted once, as a procedure; it would be our fault if it could not be read. */
export async function acceptedProcedure(source: string): Promise<Procedure> {
  const parsed = await parsedText(source);
  if (!parsed.ok) throw new Error(`A stored text can no longer be read: ${parsed.errors[0]?.message ?? ''}`);
  return parsed.procedure;
}

/** What changed from one published revision to another, in either direction. Refuses 404 an unknown one. */
export async function compareRevisions(
  actor: Actor,
  number: string,
  from: string,
  to: string,
): Promise<ComparedRevisions> {
  const [fromSheet, toSheet] = await Promise.all([readSheet(actor, number, from), readSheet(actor, number, to)]);
  const [before, after] = await Promise.all([acceptedProcedure(fromSheet.source), acceptedProcedure(toSheet.source)]);
  return {
    from: fromSheet.revision,
    to: toSheet.revision,
    comparison: compareProcedures(before, after),
    fromSheet,
    toSheet,
  };
}
