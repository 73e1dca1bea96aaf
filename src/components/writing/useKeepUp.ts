import { useEffect } from 'react';
import type { Words } from '@/domain/writing/textChanges';
import type { Keeper } from './keeper';

/** Tells the keeper of every change on the screen. */
export function useKeepUp(keeper: Keeper, words: Words): void {
  useEffect(() => {
    keeper.change(words);
  }, [keeper, words]);
}
