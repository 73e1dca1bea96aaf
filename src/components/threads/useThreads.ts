import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { ask, Refused } from '@/components/api/ask';
import type { Thread, ThreadList } from '@/domain/api/schemas/threads';
import type { StartWritten } from './startWritten';

/** Why something was not done, and to which thread; `thread` is null for one that was to be started. */
export interface ThreadTrouble {
  thread: string | null;
  /** Name of the field that is wrong, where it is one. */
  field: string | null;
  detail: string;
  /** What was typed into a plain form that came back. */
  typed?: { text: string };
}

export function threadTrouble(thread: string | null, error: unknown): ThreadTrouble {
  if (!(error instanceof Refused))
    return {
      thread,
      field: null,
      detail: 'There was no answer. What you typed is still here; try again, nothing happens twice.',
    };
  if (error.status === 401)
    return { thread, field: null, detail: 'You are signed out. Sign in again in another tab, then press once more.' };
  const [first] = error.problem.errors ?? [];
  return { thread, field: first?.path ?? null, detail: first?.message ?? error.problem.detail };
}

/** An uploaded photo that goes along, with what it shows. */
export type SentPhoto = { id: string; alt: string };

interface Wanted {
  thread: string | null;
  path: string;
  body?: unknown;
  version?: number;
  key: string;
}

/** The threads of a proposal, kept fresh, and what can be done in them. */
export function useThreads(proposalId: string, first: ThreadList) {
  const client = useQueryClient();
  const path = `/proposals/${proposalId}`;
  const { data: list } = useQuery({
    queryKey: [path, 'threads'],
    queryFn: () => ask<ThreadList>('GET', `${path}/threads`),
    initialData: first,
    staleTime: 5_000,
    retry: false,
  });
  const [trouble, setTrouble] = useState<ThreadTrouble | null>(null);
  // Two presses before the page has drawn its answer are one.
  const running = useRef(false);
  const { mutateAsync, isPending, variables } = useMutation({
    mutationFn: ({ path: to, body, version, key }: Wanted) =>
      ask<Thread>('POST', to, {
        key,
        ...(body === undefined ? {} : { body }),
        ...(version === undefined ? {} : { version }),
      }),
    // What may be published depends on what is open.
    onSettled: () => client.invalidateQueries({ queryKey: [path] }),
  });
  const run = async (wanted: Omit<Wanted, 'key'>): Promise<Thread | null> => {
    if (running.current) return null;
    running.current = true;
    setTrouble(null);
    try {
      return await mutateAsync({ ...wanted, key: crypto.randomUUID() });
    } catch (error) {
      setTrouble(threadTrouble(wanted.thread, error));
      return null;
    } finally {
      running.current = false;
    }
  };
  return {
    list,
    trouble,
    setTrouble,
    /** The thread that is being worked on; "new" for one that is being started. */
    pending: isPending ? (variables.thread ?? 'new') : null,
    start: ({ kind, at, text, quote, replacement, value, field }: StartWritten, version: number, photos: SentPhoto[]) =>
      run({
        thread: null,
        path: `${path}/threads`,
        version,
        body: {
          kind,
          anchor: (field ? `${at}.${field}` : at) || null,
          text,
          photos,
          ...(kind === 'suggestion' ? (at.startsWith('step:') ? { quote, replacement } : { value }) : {}),
        },
      }),
    reply: (thread: string, text: string, photos: SentPhoto[]) =>
      run({ thread, path: `/threads/${thread}/messages`, body: { text, photos } }),
    turn: ({ id, version }: Pick<Thread, 'id' | 'version'>, act: 'resolve' | 'reopen') =>
      run({ thread: id, path: `/threads/${id}/${act}`, version }),
    /** `version` is that of the proposal, whose text changes. */
    accept: ({ id }: Pick<Thread, 'id'>, version: number) =>
      run({ thread: id, path: `/threads/${id}/accept`, version }),
  };
}
export type Threads = ReturnType<typeof useThreads>;
