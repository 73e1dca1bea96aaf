import type { Draft } from '@/domain/writing/draft';
import { begun, nextUp, recorded, redone, undone, type History } from '@/domain/writing/history';

/** What the next step back and the next one forward would change, in words; null where there is none. */
export interface Undoable {
  undo: string | null;
  redo: string | null;
}

/** The history of one sitting at the desk. Knows nothing of the screen; what is on it is told by `record`. */
export class Undoing {
  private history: History;
  private listeners = new Set<() => void>();
  private offered: Undoable = { undo: null, redo: null };

  constructor(
    first: Draft,
    private readonly now: () => number = Date.now,
  ) {
    this.history = begun(structuredClone(first));
  }

  subscribe = (listener: () => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };
  /** The same object as long as it says the same. */
  snapshot = () => this.offered;

  private become(history: History) {
    this.history = history;
    const { undo, redo } = nextUp(history);
    const offered = { undo: undo?.said ?? null, redo: redo?.said ?? null };
    if (offered.undo === this.offered.undo && offered.redo === this.offered.redo) return;
    this.offered = offered;
    for (const listener of this.listeners) listener();
  }

  /** The draft as it is on the screen now. It is copied: the form changes its values in place. */
  record(draft: Draft): void {
    const next = recorded(this.history, draft, this.now());
    if (next !== this.history) this.become({ ...next, present: structuredClone(draft) });
  }

  /** Begins anew from here: what was before cannot be shown. */
  restart(draft: Draft): void {
    this.become(begun(structuredClone(draft)));
  }

  /** Takes one thing back or makes it again: the draft to show, what was done, and the path where; null where there is none. */
  step(way: keyof Undoable): { draft: Draft; said: string; path: string } | null {
    const entry = nextUp(this.history)[way];
    const next = way === 'undo' ? undone(this.history) : redone(this.history);
    if (!entry || !next) return null;
    this.become(next);
    return { draft: structuredClone(next.present), said: entry.said, path: entry.path };
  }
}
