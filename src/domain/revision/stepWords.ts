import type { Step } from '../procedure/types';

/** What became of a step; undefined where it was not there before, or is no longer. */
export function stepWords(before: Step | undefined, revised: Step | undefined): string {
  const step = `step “${(revised ?? before)?.title ?? ''}”`;
  return before && revised ? `the words of ${step}` : `${step}, ${revised ? 'added' : 'removed'}`;
}
