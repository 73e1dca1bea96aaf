import { useEffect, useRef, useState, useSyncExternalStore } from 'react';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Words } from '@/domain/writing/textChanges';
import { readProposal, saveProposal } from './api';
import { HeldCopy } from './heldCopy';
import { Keeper } from './keeper';
import { Others } from './others';
import { useOthers } from './useOthers';

/** As much as a request may carry that outlives its page; browsers refuse more than 64 KB. */
const KEEPALIVE_LIMIT = 60_000;

const deviceStore = () => {
  try {
    return typeof window === 'undefined' ? null : window.localStorage;
  } catch {
    return null;
  }
};

/**
 * Keeps the draft while it is written, also when the page is left.
 *
 * @param latest the words on the screen at this moment
 * @param onFound words of an earlier page that had not reached the server; they go on the screen
 */
export function useKeeping(proposal: Proposal, first: Words, latest: () => Words, onFound: (words: Words) => void) {
  const { id } = proposal;
  const [{ keeper, held, others }] = useState(() => {
    const page = crypto.randomUUID();
    const held = new HeldCopy(deviceStore(), id, page);
    const others = new Others(id);
    const keeper = new Keeper(first, proposal.version, {
      save: (words, version, leaving) =>
        saveProposal(
          id,
          version,
          { ...words, page },
          leaving && words.source.length + words.reason.length < KEEPALIVE_LIMIT,
        ),
      readTheirs: () => readProposal(id),
      held,
      saved: others.tell,
      now: () => Date.now(),
      later: (act, ms) => {
        const timer = setTimeout(act, ms);
        return () => clearTimeout(timer);
      },
    });
    return { keeper, held, others };
  });
  const state = useSyncExternalStore(keeper.subscribe, keeper.snapshot, keeper.snapshot);

  useOthers(keeper, others);

  const now = useRef({ latest, onFound });
  useEffect(() => {
    now.current = { latest, onFound };
  });

  useEffect(() => {
    const left = held.adopt();
    if (!left) return;
    if (left.source === first.source && left.reason === first.reason) held.clear();
    else {
      if (left.version !== proposal.version) keeper.found(left, proposal);
      now.current.onFound(left);
    }
    // Once, when the page opens.
  }, []);

  useEffect(() => {
    const flush = (keepalive: boolean) => {
      keeper.change(now.current.latest());
      void keeper.flush({ keepalive });
    };
    const hide = () => document.visibilityState === 'hidden' && flush(true);
    const leave = () => flush(true);
    const online = () => flush(false);
    const blur = () => flush(false);
    const guard = (event: BeforeUnloadEvent) => {
      keeper.change(now.current.latest());
      if (keeper.atRisk) event.preventDefault();
    };
    document.addEventListener('visibilitychange', hide);
    document.addEventListener('focusout', blur);
    addEventListener('pagehide', leave);
    addEventListener('online', online);
    addEventListener('beforeunload', guard);
    return () => {
      document.removeEventListener('visibilitychange', hide);
      document.removeEventListener('focusout', blur);
      removeEventListener('pagehide', leave);
      removeEventListener('online', online);
      removeEventListener('beforeunload', guard);
      keeper.dispose();
    };
  }, [keeper]);
  return { keeper, state };
}
