import { type RefObject, useEffect, useState } from 'react';
import { addressOf, type Asked } from './address';

const ADDRESS_AFTER = 200;

/** Coming back to the page finds it as it was left. */
export function keepAddress(asked: Asked): void {
  if (location.pathname + location.search !== addressOf(asked))
    history.replaceState(history.state, '', addressOf(asked));
}

/** What is asked for, as the field, the filters and the address say it. */
export function useAsked(first: Asked, field: RefObject<HTMLInputElement | null>) {
  const [asked, ask] = useState<Asked>(first);
  useEffect(() => {
    // What was typed before the page came to life counts.
    const { current } = field;
    if (current && current.value !== current.defaultValue) current.dispatchEvent(new Event('input', { bubbles: true }));
  }, [field]);
  // Browsers refuse an address that changes with every letter.
  useEffect(() => {
    const timer = setTimeout(() => {
      keepAddress(asked);
    }, ADDRESS_AFTER);
    return () => {
      clearTimeout(timer);
    };
  }, [asked]);
  return [asked, ask] as const;
}
