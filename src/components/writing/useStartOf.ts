import { useEffect, useRef } from 'react';

/**
 * Goes to the start of an element when what stands in it is another thing than before: the button that changed it stood
 * below and is gone, and a reader would be left somewhere in the middle.
 */
export function useStartOf(id: string, shows: unknown): void {
  const before = useRef(shows);
  useEffect(() => {
    if (before.current === shows) return;
    before.current = shows;
    const element = document.getElementById(id);
    element?.focus({ preventScroll: true });
    element?.scrollIntoView({ block: 'start' });
  }, [id, shows]);
}
