import { useCallback, useEffect, useRef, useState, type RefObject } from 'react';
import { Button } from '@/components/ui/Button';
import { Kbd } from '@/components/ui/Kbd';

const typing = (target: EventTarget | null) =>
  target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));

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
  const at = useRef(-1);
  const go = useCallback(
    (by: 1 | -1) => {
      if (ids.length === 0) return;
      at.current = at.current === -1 && by === -1 ? ids.length - 1 : (at.current + by + ids.length) % ids.length;
      const id = CSS.escape(ids[at.current] ?? '');
      // The new text first; a removed step is only in the old one.
      const [target] = ['new', 'old'].flatMap(
        (side) => root.current?.querySelector<HTMLElement>(`[data-line="${id}"][data-side="${side}"]`) ?? [],
      );
      target?.focus({ preventScroll: true });
      target?.scrollIntoView({
        block: 'center',
        behavior: matchMedia('(prefers-reduced-motion: reduce)').matches ? 'auto' : 'smooth',
      });
      setSaid(`Change ${at.current + 1} of ${ids.length}`);
    },
    [ids, root],
  );
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || typing(event.target)) return;
      if (event.key === 'n' || event.key === 'p') go(event.key === 'n' ? 1 : -1);
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [go]);

  return (
    <div className="change-steps print:static">
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
            <Kbd>p</Kbd>
          </Button>
          <Button className="!px-3.5" onClick={() => go(1)}>
            <span>
              Next<span className="max-sm:sr-only"> change</span>
            </span>
            <Kbd>n</Kbd>
          </Button>
        </div>
      )}
    </div>
  );
}
