import { useRef, useState } from 'react';
import { Refused, saveProposal, submitProposal } from './api';
import type { Keeper } from './keeper';

export interface Refusal {
  detail: string;
  /** Path of the form where there is one, and a sentence. */
  errors: readonly { path: string; message: string }[];
}

const refusalOf = (error: unknown): Refusal =>
  error instanceof Refused
    ? {
        detail: error.message,
        errors: (error.problem.errors ?? []).map(({ path, message }) => ({
          path: path.replace(/^source\.?/, ''),
          message,
        })),
      }
    : { detail: 'There is no network. Nothing was sent; your words are held. Try again when it is back.', errors: [] };

/** Sending the draft in, and standing it on another base. A second press while the first is under way does nothing. */
export function useProposing(id: string, keeper: Keeper) {
  const [pending, setPending] = useState(false);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const busy = useRef(false);

  const propose = async (): Promise<void> => {
    if (busy.current) return;
    busy.current = true;
    setPending(true);
    setRefusal(null);
    try {
      if (!(await keeper.flush())) throw new Error('Not kept.');
      await submitProposal(id, keeper.version, crypto.randomUUID());
      location.assign(`/proposals/${id}?done=proposed`);
      // The button stays pending until the next page is there.
    } catch (error) {
      const { state } = keeper;
      setRefusal(
        state.kind === 'refused'
          ? { detail: state.why, errors: [] }
          : state.kind === 'stale'
            ? {
                detail: 'First say which text goes on: the draft was changed in another tab or on another device.',
                errors: [],
              }
            : refusalOf(error),
      );
      busy.current = false;
      setPending(false);
    }
  };

  /** Stands `source` on revision `letter`. Returns why not, or null once the page is loading again. */
  const rebase = async (letter: string, source: string): Promise<string | null> => {
    try {
      if (!(await keeper.flush())) return 'The draft could not be kept yet. Try again once it is.';
      keeper.moved((await saveProposal(id, keeper.version, { base: letter, source })).version);
      location.reload();
      return null;
    } catch (error) {
      return refusalOf(error).detail;
    }
  };
  return { pending, refusal, setRefusal, propose, rebase };
}
