import { useCallback, useEffect, useState, type RefObject } from 'react';
import { Button } from '@/components/ui/Button';
import { Kbd } from '@/components/ui/Kbd';
import { singleKey } from '@/components/ui/singleKeys';

/** From the middle of the screen, the first change below it or the last above it. */
function beyondSight(targets: readonly HTMLElement[], by: 1 | -1): number {
  const below = (target: HTMLElement) => target.getBoundingClientRect().top > innerHeight / 2 + 1;
  const first = targets.findIndex(below);
  if (by === 1) return first === -1 ? 0 : first;
  const above = targets.findLastIndex((target) => target.getBoundingClientRect().top < innerHeight / 2 - 40);
  return above === -1 ? targets.length - 1 : above;
}

/** How many changes there are, and the way from one to the next, also by the keys N and P. */
export function ChangeSteps({
  root,
  words,
  ids,
}: {
  root: RefObject<HTMLDivElement | null>;
  words: string;
  /** Ids of the changed steps in reading order. */
  ids: readonly string[];
}) {
  const [said, setSaid] = useState('');
  const go = useCallback(
    (by: 1 | -1) => {
      // The new text first; a removed step is only in the old one.
      const targets = ids.flatMap((id) => {
        const found = ['new', 'old'].map((side) =>
          root.current?.querySelector<HTMLElement>(`[data-line="${CSS.escape(id)}"][data-side="${side}"]`),
        );
        return found.find((element) => element?.getClientRects().length) ?? [];
      });
      const here = targets.findIndex((target) => target === document.activeElement);
      const next = here === -1 ? beyondSight(targets, by) : here + by;
      const at = (next + targets.length) % targets.length;
      targets[at]?.focus({ preventScroll: true });
      targets[at]?.scrollIntoView({
        block: 'center',
        behavior: matchMedia('(prefers-reduced-motion: reduce)').matches ? 'auto' : 'smooth',
      });
      setSaid(`Change ${at + 1} of ${targets.length}`);
    },
    [ids, root],
  );
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const key = singleKey(event);
      if (key === 'n' || key === 'p') go(key === 'n' ? 1 : -1);
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [go]);

  return (
    <div className="change-steps">
      <p className="font-medium">{words}</p>
      {ids.length > 0 && (
        <div data-needs-script="" className="ml-auto flex items-center gap-2.5 print:hidden">
          <p role="status" className="whitespace-nowrap text-ink-2 max-sm:sr-only">
            {said}
          </p>
          <Button className="!px-3.5" onClick={() => go(-1)}>
            <span>
              Previous<span className="max-sm:sr-only"> change</span>
            </span>
            <Kbd className="max-sm:hidden">p</Kbd>
          </Button>
          <Button className="!px-3.5" onClick={() => go(1)}>
            <span>
              Next<span className="max-sm:sr-only"> change</span>
            </span>
            <Kbd className="max-sm:hidden">n</Kbd>
          </Button>
        </div>
      )}
    </div>
  );
}
