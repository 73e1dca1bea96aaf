import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { ask, Refused } from '@/components/api/ask';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { ReviewAct } from './words';

export interface Wanted {
  act: ReviewAct;
  reason?: string;
  anchor?: string | null;
  /** Key of the torque whose clamp check is overridden. */
  torque?: string;
}

/** Why an act did not go through. */
export interface Trouble {
  act: ReviewAct;
  torque?: string | undefined;
  status: number;
  /** What is wrong with the reason, for beside its field. */
  field: string | null;
  detail: string;
}

function troubleOf(act: ReviewAct, error: unknown): Trouble {
  if (!(error instanceof Refused))
    return {
      act,
      status: 0,
      field: null,
      detail: 'There was no answer, so it is not known whether it was done. Try again; nothing happens twice.',
    };
  const { status, problem } = error;
  if (status === 401)
    return {
      act,
      status,
      field: null,
      detail: 'You are signed out. Sign in again in another tab, then press once more.',
    };
  return {
    act,
    status,
    field: problem.errors?.find(({ path }) => path === 'reason')?.message ?? null,
    detail: problem.detail,
  };
}

/**
 * A proposal that is being judged, kept fresh, and the acts on it. Every act says which version it was judged by: the
 * one whose text is on the screen.
 */
export function useReviewActs(first: Proposal) {
  const client = useQueryClient();
  const path = `/proposals/${first.id}`;
  const { data: proposal } = useQuery({
    queryKey: [path],
    queryFn: () => ask<Proposal>('GET', path),
    initialData: first,
    staleTime: 5_000,
    retry: false,
  });
  const [judged, setJudged] = useState(first.version);
  const [done, setDone] = useState<ReviewAct | null>(null);
  const [trouble, setTrouble] = useState<Trouble | null>(null);
  // Pressed twice before the page has drawn its answer to the first press is pressed once.
  const running = useRef(false);
  const { mutate, isPending, variables } = useMutation({
    mutationFn: ({ act, reason, anchor, torque, key }: Wanted & { key: string }) =>
      ask<Proposal>('POST', `${path}/${torque === undefined ? act : 'overrides'}`, {
        version: judged,
        key,
        ...(reason === undefined
          ? {}
          : { body: torque === undefined ? { reason, anchor: anchor ?? null } : { torque, reason } }),
      }),
    onMutate: () => setTrouble(null),
    onSuccess: (result, { act }) => {
      client.setQueryData([path], result);
      setJudged(result.version);
      setDone(act);
    },
    onError: (error, { act, torque }) => {
      setTrouble({ ...troubleOf(act, error), torque });
      void client.invalidateQueries({ queryKey: [path] });
    },
    onSettled: () => {
      running.current = false;
    },
  });
  return {
    proposal,
    done,
    trouble,
    pending: isPending ? variables.act : null,
    /** The proposal went on without us: its text on the screen may no longer be what stands. */
    movedOn: proposal.version !== judged,
    act: (wanted: Wanted, onDone?: () => void) => {
      if (running.current) return;
      running.current = true;
      mutate({ ...wanted, key: crypto.randomUUID() }, onDone ? { onSuccess: onDone } : {});
    },
  };
}
