import { keepPreviousData, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { SearchReply } from '@/domain/api/schemas/search';
import type { SearchAnswer } from '@/domain/search/engine';
import type { Matched } from '@/domain/search/explain';
import { type Asked, parametersOf } from './address';
import { theBook } from './book';

export interface Given {
  person: string;
  units: 'metric' | 'inch';
  /** What the page was made with: shown at once, and until anything else is asked. */
  asked: Asked;
  answer: SearchAnswer;
  limit: number;
}

type Prose = [number: string, matched: Matched][];

const proseOf = ({ hits }: SearchAnswer): Prose =>
  hits.flatMap(({ number, matched }): Prose => {
    const text = matched.find(({ field }) => field === 'text');
    return text ? [[number, text]] : [];
  });

async function askServer(asked: Asked, limit: number, signal: AbortSignal): Promise<SearchAnswer> {
  const { engine, system, fit } = asked.filters;
  const parameters = new URLSearchParams({
    q: asked.q,
    engine: engine.join(','),
    system: system.join(','),
    fit: fit.join(','),
    limit: String(limit),
  });
  const response = await fetch(`/api/v1/search?${parameters.toString()}`, { signal });
  if (!response.ok) throw new Error(`Search answered ${response.status}.`);
  const { items, ...rest } = (await response.json()) as SearchReply;
  return { hits: items as SearchAnswer['hits'], ...rest };
}

const whenIdle = (then: () => void): (() => void) => {
  if (!('requestIdleCallback' in globalThis)) {
    const timer = setTimeout(then, 200);
    return () => {
      clearTimeout(timer);
    };
  }
  const handle = requestIdleCallback(then, { timeout: 1500 });
  return () => {
    cancelIdleCallback(handle);
  };
};

/** The index, loaded when the page has nothing better to do, and looked after when the reader comes back to it. */
function useIndex(person: string): { ready: boolean; failed: boolean } {
  const [idle, setIdle] = useState(false);
  useEffect(
    () =>
      whenIdle(() => {
        setIdle(true);
      }),
    [],
  );
  const { isSuccess, isError, data } = useQuery({
    queryKey: ['index', person],
    queryFn: () => theBook().load(person),
    enabled: idle,
    staleTime: 60_000,
    networkMode: 'always',
    retry: 1,
  });
  return { ready: isSuccess || data !== undefined, failed: isError };
}

/** `value` once it has stood still for `ms`. */
function useSettled<T>(value: T, ms: number): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => {
      setSettled(value);
    }, ms);
    return () => {
      clearTimeout(timer);
    };
  }, [value, ms]);
  return settled;
}

const PROSE_AFTER = 250;
const SERVER_LIMIT = 200;

/** What the book answers: at once from the page's own index, then with the sheets that only the server's text search finds. */
export function useAnswer(asked: Asked, limit: number, given: Given) {
  const client = useQueryClient();
  const { ready, failed } = useIndex(given.person);
  const key = parametersOf(asked).toString();
  const first = key === parametersOf(given.asked).toString();
  const settled = useSettled(key, PROSE_AFTER);

  const prose = useQuery({
    queryKey: ['prose', key],
    queryFn: async ({ signal }) => proseOf(await askServer(asked, SERVER_LIMIT, signal)),
    enabled: ready && settled === key && asked.q.trim().length > 2,
    initialData: first ? proseOf(given.answer) : undefined,
    staleTime: 60_000,
    retry: false,
  });
  const inProse = prose.data ?? [];
  const options = {
    queryKey: ['answer', ready ? 'page' : 'server', key, limit, inProse.map(([number]) => number).join()],
    queryFn: ({ signal }: { signal: AbortSignal }): Promise<SearchAnswer> =>
      ready
        ? theBook().ask({ text: asked.q, filters: asked.filters, limit, units: given.units, inProse })
        : askServer(asked, limit, signal),
    staleTime: 60_000,
    networkMode: ready ? ('always' as const) : ('online' as const),
    retry: false,
  };
  const answer = useQuery({
    ...options,
    initialData: first && limit === given.limit && !ready ? given.answer : undefined,
    placeholderData: keepPreviousData,
  });
  return {
    ready,
    /** The last answer there is; of an earlier query where `late`. */
    answer: answer.data ?? given.answer,
    late: answer.isPlaceholderData,
    lost: answer.isError || (answer.fetchStatus === 'paused' && failed),
    /** The answer to exactly this, for who cannot wait for the page to show it. */
    settle: () => client.fetchQuery(options),
  };
}
