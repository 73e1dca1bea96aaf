import { useEffect, type KeyboardEvent, type RefObject } from 'react';

/**
 * A list of acts that opens over the page: a press or focus elsewhere closes it, arrows go through what is marked
 * `data-item`, and Escape closes it for whoever came by key. The first act takes the focus.
 *
 * @returns what to do with a key that is pressed inside
 */
export function useListOfActs(root: RefObject<HTMLElement | null>, open: boolean, close: (byKey: boolean) => void) {
  useEffect(() => {
    if (!open) return;
    const outside = (event: Event) => {
      if (event.target instanceof Node && !root.current?.contains(event.target)) close(false);
    };
    document.addEventListener('pointerdown', outside);
    document.addEventListener('focusin', outside);
    return () => {
      document.removeEventListener('pointerdown', outside);
      document.removeEventListener('focusin', outside);
    };
  }, [open, root, close]);
  useEffect(() => {
    if (open) root.current?.querySelector<HTMLElement>('[data-item]')?.focus();
  }, [open, root]);
  return (event: KeyboardEvent) => {
    if (event.key === 'Escape' && open) {
      event.stopPropagation();
      close(true);
    }
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const items = [...(root.current?.querySelectorAll<HTMLElement>('[data-item]') ?? [])];
    const at = items.indexOf(document.activeElement as HTMLElement);
    if (at < 0) return;
    event.preventDefault();
    items[(at + (event.key === 'ArrowDown' ? 1 : items.length - 1)) % items.length]?.focus();
  };
}
