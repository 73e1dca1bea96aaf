import { useEffect, useState, type ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import type { Keeping } from './keeper';
import { keepingWords } from './keepingWords';
import { UndoButtons } from './UndoButtons';
import type { DeskUndo } from './useUndoing';

/** The time, every ten seconds; null until the page runs in a browser. */
function useNow(): number | null {
  const [now, setNow] = useState<number | null>(null);
  useEffect(() => {
    const tick = () => setNow(Date.now());
    const first = setTimeout(tick, 0);
    const timer = setInterval(tick, 10_000);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
    };
  }, []);
  return now;
}

/** Announced only when it says something new, not every ten seconds. */
function Kept({ state, opened }: { state: Keeping; opened: number }) {
  const now = useNow();
  const at = state.kind === 'kept' ? (state.at ?? opened) : 0;
  return (
    <>
      <p className="text-ink-2" aria-hidden="true" data-keeping={state.kind}>
        {keepingWords(state, opened, now === null ? null : Math.max(now, at))}
      </p>
      {state.kind === 'unreachable' && state.why === 'signed out' && (
        <a href="/sign-in" target="_blank" className="inline-flex items-center">
          Sign in in another tab
        </a>
      )}
      <p className="sr-only" role="status">
        {state.kind === 'waiting' || state.kind === 'keeping' ? '' : keepingWords(state, opened, null)}
      </p>
    </>
  );
}

/** What is being written, how it stands with the draft, and the two things to do with it. */
export function DeskHead({
  title,
  state,
  opened,
  changes,
  onChanges,
  onPropose,
  pending,
  undoing,
  versions,
  children,
}: {
  title: string;
  state: Keeping;
  opened: number;
  /** What changes is on the screen. */
  changes: boolean;
  onChanges: () => void;
  onPropose: () => void;
  pending: boolean;
  undoing: DeskUndo;
  /** The way to the earlier versions. */
  versions: ReactNode;
  children?: ReactNode;
}) {
  return (
    <header className="writing-head">
      <div className="min-w-0 flex-1">
        <h1 className="text-[1.25rem] leading-tight lg:text-[1.5rem]">{title}</h1>
        <div className="flex min-w-0 flex-wrap items-center gap-x-5">
          <Kept state={state} opened={opened} />
          {versions}
          <UndoButtons undoing={undoing} />
          {children}
        </div>
      </div>
      <div className="writing-acts">
        <Button aria-pressed={changes} onClick={onChanges}>
          {changes ? 'Back to writing' : 'See what changes'}
        </Button>
        <Button kind="main" pending={pending} pendingText="Proposing" onClick={onPropose}>
          Propose
        </Button>
      </div>
    </header>
  );
}
