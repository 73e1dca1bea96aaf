import { useEffect, useId, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { classes } from '@/components/ui/classes';

/**
 * A button that opens a small list of acts under itself. Escape and a press elsewhere close it; arrows go through
 * the list. `children` are given the way to close it.
 */
export function Menu({ label, children }: { label: string; children: (close: () => void) => ReactNode }) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const panel = useId();
  useEffect(() => {
    if (!open) return;
    const outside = (event: Event) => {
      if (event.target instanceof Node && !root.current?.contains(event.target)) setOpen(false);
    };
    document.addEventListener('pointerdown', outside);
    document.addEventListener('focusin', outside);
    return () => {
      document.removeEventListener('pointerdown', outside);
      document.removeEventListener('focusin', outside);
    };
  }, [open]);
  useEffect(() => {
    if (open) root.current?.querySelector<HTMLElement>('[data-item]')?.focus();
  }, [open]);
  const close = () => setOpen(false);
  const keys = (event: KeyboardEvent) => {
    if (event.key === 'Escape' && open) {
      event.stopPropagation();
      close();
      button.current?.focus();
    }
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const items = [...(root.current?.querySelectorAll<HTMLElement>('[data-item]') ?? [])];
    const at = items.indexOf(document.activeElement as HTMLElement);
    if (at < 0) return;
    event.preventDefault();
    items[(at + (event.key === 'ArrowDown' ? 1 : items.length - 1)) % items.length]?.focus();
  };
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
        className={classes(
          'min-h-[40px] rounded border border-rule px-3 font-medium hover:bg-wash',
          open ? 'bg-wash' : 'bg-white',
        )}
      >
        {label}
      </button>
      <div
        id={panel}
        hidden={!open}
        className="frame absolute left-0 top-full z-20 mt-1 max-h-80 w-[min(24rem,calc(100vw-2.5rem))] overflow-auto py-1.5"
      >
        {open && children(close)}
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
