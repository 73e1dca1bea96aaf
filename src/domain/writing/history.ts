import { draftChanges, inOne, type DraftChange } from './changes';
import type { Draft } from './draft';

/** One thing that can be taken back, or made again. */
interface Entry {
  /** The draft on its far side: before it among what can be undone, after it among what can be made again. */
  draft: Draft;
  /** "step 3 deleted" */
  said: string;
  /** Of the first thing that it changed, as `draftChanges` names it. */
  path: string;
  /** The one field that was typed in; null for anything else. */
  typedIn: string | null;
  /** When it began, and when it was last added to, in milliseconds. */
  since: number;
  at: number;
}

/** What was done to a draft in one sitting. The newest entries stand last. */
export interface History {
  undone: readonly Entry[];
  done: readonly Entry[];
  present: Draft;
}

/** So much can be taken back; of a longer sitting the oldest is forgotten. */
export const MOST_ENTRIES = 100;
/** Typing in one field goes on as one entry until it rests for so long, or lasts for so long. */
export const PAUSE = 2000;
export const LONGEST = 20_000;

export const begun = (present: Draft): History => ({ done: [], undone: [], present });

const typedIn = (changes: readonly DraftChange[]): string | null => {
  const [first, ...more] = changes;
  return first?.kind === 'typed' && more.every(({ kind }) => kind === 'named') ? first.path : null;
};

/**
 * The history once the draft has become `next`. Where nothing differs it is the same one. An id that a step got from its
 * title is nothing to take back by itself, and lets what was undone stand.
 */
export function recorded(history: History, next: Draft, at: number): History {
  const changes = draftChanges(history.present, next);
  const [first] = changes;
  if (!first) return history;
  if (changes.every(({ kind }) => kind === 'named')) return { ...history, present: next };
  const { done, undone, present } = history;
  const last = done.at(-1);
  const field = typedIn(changes);
  const goesOn =
    last &&
    field !== null &&
    last.typedIn === field &&
    undone.length === 0 &&
    at - last.at <= PAUSE &&
    at - last.since <= LONGEST;
  if (!goesOn) {
    const entry: Entry = { draft: present, said: inOne(changes), path: first.path, typedIn: field, since: at, at };
    return { done: [...done, entry].slice(-MOST_ENTRIES), undone: [], present: next };
  }
  const whole = draftChanges(last.draft, next);
  const before = done.slice(0, -1);
  // Typed, and typed back: there is nothing to take back any more.
  if (whole.length === 0) return { done: before, undone, present: next };
  return { done: [...before, { ...last, said: inOne(whole), at }], undone, present: next };
}

/** An entry that nothing is added to any more. */
const closed = (entry: Entry, draft: Draft): Entry => ({ ...entry, draft, typedIn: null });

/** Takes the newest entry back; null where there is none. */
export function undone({ done, undone: taken, present }: History): History | null {
  const last = done.at(-1);
  return last ? { done: done.slice(0, -1), undone: [...taken, closed(last, present)], present: last.draft } : null;
}

/** Makes the entry again that was taken back last; null where there is none. */
export function redone({ done, undone: taken, present }: History): History | null {
  const last = taken.at(-1);
  return last ? { done: [...done, closed(last, present)], undone: taken.slice(0, -1), present: last.draft } : null;
}

/** What the next step back and the next one forward would change; null where there is none. */
export const nextUp = ({ done, undone: taken }: History): { undo: Entry | null; redo: Entry | null } => ({
  undo: done.at(-1) ?? null,
  redo: taken.at(-1) ?? null,
});
