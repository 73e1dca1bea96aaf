import { useMemo, useSyncExternalStore } from 'react';
import { readRecent, type RecentSheet, recentFrom } from './kept';

const never = (): (() => void) => () => undefined;

/** The sheets this person opened last on this machine; none while the server makes the page, which cannot know. */
export function useRecent(person: string): RecentSheet[] {
  const kept = useSyncExternalStore(
    never,
    () => readRecent(person),
    () => '',
  );
  return useMemo(() => recentFrom(kept), [kept]);
}
