import { useCallback, useId, useRef, useState, type ReactNode } from 'react';
import { classes } from '@/components/ui/classes';
import { useListOfActs } from './useListOfActs';

/**
 * A button that opens a small list of acts under itself. Escape and a press elsewhere close it; arrows go through
 * the list. `children` are given the way to close it.
 */
export function Menu({
  label,
  quiet = false,
  children,
}: {
  label: string;
  /** At the end of a line, without a frame; opens to the left. */
  quiet?: boolean;
  children: (close: () => void) => ReactNode;
}) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const panel = useId();
  const close = useCallback((byKey: boolean) => {
    setOpen(false);
    if (byKey) button.current?.focus();
  }, []);
  const shut = useCallback(() => setOpen(false), []);
  const keys = useListOfActs(root, open, close);
  return (
    // The keys are those of the buttons inside; the box itself is nothing to press.
    // eslint-disable-next-line jsx-a11y/no-static-element-interactions
    <div ref={root} className="relative" onKeyDown={keys}>
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        aria-controls={panel}
        onClick={() => setOpen(!open)}
        className={
          quiet
            ? '-my-2.5 min-h-touch px-1 font-medium text-petrol underline underline-offset-[3px]'
            : classes(
                'min-h-[40px] rounded border border-rule px-3 font-medium hover:bg-wash',
                open ? 'bg-wash' : 'bg-white',
              )
        }
      >
        {label}
      </button>
      <div
        id={panel}
        hidden={!open}
        className={classes(
          'frame absolute top-full z-20 mt-1 max-h-[26rem] w-[min(24rem,calc(100vw-2.5rem))] overflow-auto py-1.5',
          quiet ? 'right-0' : 'left-0',
        )}
      >
        {open && children(shut)}
      </div>
    </div>
  );
}

/** One thing to choose. `detail` stands behind it, quieter. */
export const MenuItem = ({
  detail,
  onChoose,
  children,
}: {
  detail?: string;
  onChoose: () => void;
  children: ReactNode;
}) => (
  <button
    type="button"
    data-item
    onClick={onChoose}
    className="flex min-h-[42px] w-full items-center justify-between gap-4 px-3.5 text-left leading-tight hover:bg-wash"
  >
    <span className="font-medium">{children}</span>
    {detail && <span className="shrink-0 text-small text-ink-2">{detail}</span>}
  </button>
);
