import { useEffect, useRef, useState, useSyncExternalStore } from 'react';
import type { Draft } from '@/domain/writing/draft';
import { Undoing, type Undoable } from './undoing';

/** Fields whose words have an undo of their own. */
const TYPED_IN = 'input:not([type=checkbox], [type=radio], [type=button], [type=submit]), textarea, [contenteditable]';
const hasOwnUndo = (target: EventTarget | null) => target instanceof Element && target.closest(TYPED_IN) !== null;

/** Ctrl+Z, or Cmd+Z; with Shift, or Ctrl+Y, the other way. Null for any other key. */
export function wayOfKey(
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'altKey'>,
): keyof Undoable | null {
  if (event.altKey || event.ctrlKey === event.metaKey) return null;
  const key = event.key.toLowerCase();
  if (key === 'z') return event.shiftKey ? 'redo' : 'undo';
  return key === 'y' && event.ctrlKey && !event.shiftKey ? 'redo' : null;
}

export interface DeskUndo extends Undoable {
  /** False while the sheet is edited as text, which has an undo of its own. */
  active: boolean;
  step: (way: keyof Undoable) => void;
  /** Said once it was done: "Undone: step 3 deleted". */
  said: string;
  restart: (draft: Draft) => void;
}

/**
 * Undo and redo of everything that the form changes. Where the caret stands in a field that has words of its own, the keys
 * are left to that field.
 *
 * @param latest the draft as it is in the form at this moment
 * @param active false while the sheet is edited as text, which has an undo of its own
 * @param show puts a draft on the screen, at the path where it changed
 */
export function useUndoing(
  draft: Draft,
  latest: () => Draft,
  active: boolean,
  show: (draft: Draft, path: string) => void,
): DeskUndo {
  const [undoing] = useState(() => new Undoing(draft));
  const [said, setSaid] = useState('');
  const offered = useSyncExternalStore(undoing.subscribe, undoing.snapshot, undoing.snapshot);
  useEffect(() => undoing.record(draft), [undoing, draft]);

  const step = (way: keyof Undoable) => {
    undoing.record(latest());
    const done = undoing.step(way);
    if (!done) return;
    show(done.draft, done.path);
    setSaid(`${way === 'undo' ? 'Undone' : 'Done again'}: ${done.said}`);
  };
  const now = useRef({ step, active });
  useEffect(() => {
    now.current = { step, active };
  });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const way = wayOfKey(event);
      if (!way || event.defaultPrevented || !now.current.active || hasOwnUndo(event.target)) return;
      event.preventDefault();
      now.current.step(way);
    };
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, []);
  return {
    ...offered,
    active,
    step,
    said,
    restart: (next) => undoing.restart(next),
  };
}
