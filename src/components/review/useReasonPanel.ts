import { useEffect, useRef, useState } from 'react';
import { keepReason, keptReason, type Written } from './keptReason';
import type { ReviewAct } from './words';

/** The panel that is open: what it asks for, and the place on the page that it was opened at; empty for the head. */
interface Panel {
  written: Written;
  at: string;
}

/**
 * The one panel of a proposal that asks for a reason, and what is typed into it: kept for the tab, and laid aside when
 * the panel is closed, so that it stands there again when one is opened.
 */
export function useReasonPanel(id: string, asked: Written | null) {
  const [panel, setPanel] = useState<Panel | null>(asked && { written: asked, at: asked.anchor });
  const laidAside = useRef('');

  useEffect(() => {
    const kept = keptReason(id);
    if (!kept || asked?.text) return undefined;
    laidAside.current = kept.text;
    if (!kept.open) return undefined;
    const frame = requestAnimationFrame(() => setPanel({ written: kept, at: '' }));
    return () => cancelAnimationFrame(frame);
  }, [id, asked]);

  return {
    panel,
    open: (act: ReviewAct, anchor = '') =>
      setPanel({
        written: { act, anchor, text: panel?.written.text ?? laidAside.current },
        at: act === 'publish' ? '' : anchor,
      }),
    write: (written: Written) => {
      setPanel({ written, at: panel?.at ?? '' });
      keepReason(id, written);
    },
    close: () => {
      laidAside.current = panel?.written.text ?? '';
      keepReason(id, panel?.written ?? null, false);
      setPanel(null);
      document.getElementById(`ask-${panel?.at ? panel.at : (panel?.written.act ?? '')}`)?.focus();
    },
    /** What it asked for has been done: nothing of it is kept. */
    finish: () => {
      setPanel(null);
      laidAside.current = '';
      keepReason(id, null);
    },
  };
}
