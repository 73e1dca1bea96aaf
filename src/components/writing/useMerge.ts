import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { Procedure } from '@/domain/procedure/types';
import type { Choices, Conflict } from '@/domain/revision/mergeTypes';
import type { Comparison } from '@/domain/revision/types';
import { procedureOf } from '@/domain/writing/procedureOf';
import { readDraft } from '@/domain/writing/readDraft';
import type { Standing } from './writingProps';

export interface Merged {
  source: string;
  conflicts: Conflict[];
  /** What the merged text changes in the text on the screen. */
  cameIn: Comparison;
}

/**
 * The text on the screen brought together with what was published meanwhile, as it is being written and chosen.
 *
 * @param mine null while it cannot be read
 */
export function useMerge(base: Standing | null, current: Standing, mine: Procedure | null, choices: Choices) {
  const { data } = useQuery<Merged | null>({
    queryKey: ['merge', base?.letter, current.letter, mine, choices],
    queryFn: async () => {
      const [{ merge }, { compareProcedures }, { toSource }] = await Promise.all([
        import('@/domain/revision/merge'),
        import('@/domain/revision/compare'),
        import('@/domain/procedure/canonical'),
      ]);
      const [before, theirs] = [base && readDraft(base.source), readDraft(current.source)];
      if (!before || !theirs || !mine) return null;
      const { procedure, conflicts } = merge(procedureOf(before), mine, procedureOf(theirs), choices);
      return { source: toSource(procedure), conflicts, cameIn: compareProcedures(mine, procedure) };
    },
    enabled: mine !== null && base !== null,
    placeholderData: keepPreviousData,
    networkMode: 'always',
    staleTime: Infinity,
    gcTime: 10_000,
    retry: false,
  });
  return mine === null ? null : data;
}
