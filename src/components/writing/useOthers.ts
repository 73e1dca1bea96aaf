import { useEffect } from 'react';
import type { Keeper } from './keeper';
import type { Others } from './others';

const EVERY = 30_000;

/**
 * Finds out early that the draft was saved in another tab or on another device: at once where a tab says so, when the page
 * comes into view, and every half minute while it is. Words that wait are sent instead, which finds out the same.
 */
export function useOthers(keeper: Keeper, others: Others): void {
  useEffect(() => {
    const look = () => void keeper.look();
    const seen = () => {
      if (document.visibilityState !== 'visible') return;
      if (keeper.atRisk) void keeper.flush();
      else look();
    };
    const stop = others.listen(look);
    const timer = setInterval(() => document.visibilityState === 'visible' && look(), EVERY);
    document.addEventListener('visibilitychange', seen);
    return () => {
      stop();
      clearInterval(timer);
      document.removeEventListener('visibilitychange', seen);
    };
  }, [keeper, others]);
}
