import type { ThreadVerdict } from '@/domain/review/threads';
import { refusalOf, stale } from '../../refusal';

/** Refuses what the rules of threads refuse: 404, 403 or 409. */
export function insist(verdict: ThreadVerdict): void {
  if (!verdict.ok) throw refusalOf(verdict);
}

/** Refuses 409 where the caller stands on another version than is there. null says nothing and passes. */
export function insistOnVersion(given: number | null, standing: { version: number; state: string }): void {
  if (given === null || given === standing.version) return;
  throw stale(
    'This was changed after you opened it. Nothing was done and nothing you typed was lost: look at what stands there now.',
    {
      version: standing.version,
      state: standing.state,
    },
  );
}
