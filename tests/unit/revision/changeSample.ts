import { parseProcedure } from '@/domain/procedure/parse';
import type { Procedure } from '@/domain/procedure/types';
import { text } from '../../integration/api/support/text';

/** The small text of the API's tests, read, with a change made to it. */
export function parsedSample(change: (procedure: Procedure) => void = () => undefined): Procedure {
  const parsed = parseProcedure(text());
  if (!parsed.ok) throw new Error(parsed.errors[0]?.message);
  const procedure = structuredClone(parsed.procedure);
  change(procedure);
  return procedure;
}
