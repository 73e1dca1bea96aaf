import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { agreementsNeeded } from '@/domain/review/rules';
import type { Procedure } from '@/domain/procedure/types';
import type { Comparison } from '@/domain/revision/types';

/** What the draft changes against its base. The rules come with the first question, not with the page. */
export function useChanges(source: string, base: Procedure | null, procedure: Procedure | null) {
  const { data } = useQuery<Comparison>({
    queryKey: ['changes', source],
    queryFn: async () => {
      const { compareProcedures } = await import('@/domain/revision/compare');
      return compareProcedures(base, procedure as Procedure);
    },
    enabled: procedure !== null,
    placeholderData: keepPreviousData,
    networkMode: 'always',
    staleTime: Infinity,
    gcTime: 60_000,
    retry: false,
  });
  return data;
}

/** How many must agree, and why. */
export const needsOf = ({ criticalReasons }: Comparison) => ({
  editors: agreementsNeeded(criticalReasons),
  reasons: criticalReasons,
});
