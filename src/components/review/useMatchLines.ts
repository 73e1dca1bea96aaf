import { useCallback, useLayoutEffect, useRef, useState, type RefObject } from 'react';
import type { StepPair } from '@/domain/revision/twoTexts';
import { matchLines, type Line, type Place } from './matchLines';

export interface Drawn {
  width: number;
  height: number;
  lines: Line[];
}

/** Middle of the first line of what carries a step's place, below `top`; null where it is not shown. */
function middle(root: HTMLElement, id: string, side: 'old' | 'new', top: number): number | null {
  const element = root.querySelector<HTMLElement>(`[data-line="${CSS.escape(id)}"][data-side="${side}"]`);
  const [first] = element?.getClientRects() ?? [];
  if (!element || !first) return null;
  const line = Number.parseFloat(getComputedStyle(element).lineHeight) || first.height;
  return first.top - top + Math.min(first.height, line) / 2;
}

/**
 * Measures both panes and draws the lines between them, again whenever something grows, folds or is set in another
 * font. Nothing is drawn where there is no gutter.
 *
 * @param rows what is joined: each step, and each fold by its id
 */
export function useMatchLines(
  root: RefObject<HTMLDivElement | null>,
  rows: readonly Pick<StepPair, 'id' | 'kind' | 'moved'>[],
): Drawn {
  const [drawn, setDrawn] = useState<Drawn>({ width: 0, height: 0, lines: [] });
  const latest = useRef(rows);
  const draw = useCallback(() => {
    const panes = root.current;
    const box = panes?.querySelector('[data-gutter]')?.getBoundingClientRect();
    if (!panes || !box || box.width === 0) return setDrawn({ width: 0, height: 0, lines: [] });
    const places = latest.current.map(({ id, kind, moved }): Place => ({
      id,
      kind,
      moved,
      old: middle(panes, id, 'old', box.top),
      now: middle(panes, id, 'new', box.top),
    }));
    return setDrawn({ width: box.width, height: box.height, lines: matchLines(places, box.width) });
  }, [root]);

  useLayoutEffect(() => {
    latest.current = rows;
    draw();
  }, [rows, draw]);

  useLayoutEffect(() => {
    const panes = root.current;
    if (!panes) return undefined;
    const watch = new ResizeObserver(draw);
    for (const element of panes.querySelectorAll('[data-gutter], [data-pane]')) watch.observe(element);
    document.fonts.addEventListener('loadingdone', draw);
    return () => {
      watch.disconnect();
      document.fonts.removeEventListener('loadingdone', draw);
    };
  }, [root, draw]);
  return drawn;
}
