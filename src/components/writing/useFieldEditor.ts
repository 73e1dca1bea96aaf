import { useSyncExternalStore, type ComponentType } from 'react';
import type FieldEditor from './field/FieldEditor';

type Editor = ComponentType<Parameters<typeof FieldEditor>[0]>;
type Loading = { editor: Editor | null; failed: boolean };

const BEFORE: Loading = { editor: null, failed: false };
let state: Loading = BEFORE;
const listeners = new Set<() => void>();
let asked = false;

function settle(next: Loading) {
  state = next;
  for (const listener of listeners) listener();
}

/** The editor of words comes in a file of its own, so that the desk is on the screen before it; asked for once. */
function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  if (!asked) {
    asked = true;
    import('./field/FieldEditor').then(
      ({ default: editor }) => settle({ editor, failed: false }),
      () => settle({ editor: null, failed: true }),
    );
  }
  return () => listeners.delete(listener);
}

export const useFieldEditor = (): Loading =>
  useSyncExternalStore(
    subscribe,
    () => state,
    () => BEFORE,
  );
