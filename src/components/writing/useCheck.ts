import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import type { CheckResult } from '@/domain/api/schemas/check';
import { sizeProblem } from '@/domain/procedure/bounds';
import type { Procedure, SourceProblem } from '@/domain/procedure/types';
import { headProblems } from '@/domain/writing/problems';
import { checkSource, Refused } from './api';

const PAUSE = 600;

/** `value` once it has not changed for a while. */
function useSettled<T>(value: T, ms: number): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return settled;
}

export interface Checked {
  problems: readonly SourceProblem[];
  notices: readonly SourceProblem[];
  /** What a template, an import or the empty sheet left to the author, and is there still. */
  toFillIn: readonly SourceProblem[];
  /** The last text that could be read, as the sheet shows it. */
  preview: CheckResult['preview'];
  /** The preview is of an earlier text, because this one cannot be read. */
  previewIsOld: boolean;
  /** Nothing is known of the text as it stands now. */
  checking: boolean;
  /** Why it cannot be checked, in words; null where it can. */
  failed: string | null;
}

/** The words of whoever refused to check. */
const wordsOf = (error: Error | null) =>
  error === null ? null : error instanceof Refused ? error.message : 'It cannot be checked without a network.';

/**
 * Checks the text a little after the last change; a check that was overtaken is called off. What the schema finds
 * is there at once.
 *
 * @param procedure null while the text is edited as text
 */
export function useCheck(source: string, procedure: Procedure | null): Checked {
  const settled = useSettled(source, PAUSE);
  const large = sizeProblem(settled);
  const { data, error, isFetching } = useQuery({
    queryKey: ['check', settled],
    queryFn: ({ signal }) => checkSource({ source: settled, preview: true }, signal),
    placeholderData: keepPreviousData,
    enabled: large === null,
    staleTime: Infinity,
    gcTime: 60_000,
    retry: 1,
  });
  const [preview, setPreview] = useState<CheckResult['preview']>();
  if (data?.preview && data.preview !== preview) setPreview(data.preview);
  const head = useMemo(() => (procedure ? headProblems(procedure) : null), [procedure]);
  const found = data?.errors ?? [];
  const bodies = found.filter((p) => !p.path || /^(steps|intro)/.test(p.path));
  const problems = large ? [large] : head ? [...head, ...bodies] : found;
  return {
    problems,
    notices: data?.notices ?? [],
    toFillIn: data?.toFillIn ?? [],
    preview,
    previewIsOld: problems.length > 0,
    checking: source !== settled || isFetching,
    failed: wordsOf(error),
  };
}
