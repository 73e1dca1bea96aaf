import { useSyncExternalStore } from 'react';
import type { Draft } from '@/domain/writing/draft';
import type { Desk } from './desk';
import { hashOfPlace, placeOfHash, type Place } from './places';

const subscribe = (listener: () => void) => {
  addEventListener('hashchange', listener);
  return () => removeEventListener('hashchange', listener);
};

/** The chosen place stands in the address, so that the browser's own back and a link from the sheet work. */
export function usePlace(draft: Draft): { place: Place; choose: Desk['choose'] } {
  const hash = useSyncExternalStore(
    subscribe,
    () => location.hash,
    () => '',
  );
  return {
    place: placeOfHash(hash, draft),
    choose: (place, how) => {
      if (how?.replace) {
        history.replaceState(history.state, '', hashOfPlace(place));
        dispatchEvent(new HashChangeEvent('hashchange'));
      } else location.hash = hashOfPlace(place);
    },
  };
}

/** Puts the caret into the field with this id once it is on the screen; gives up after a quarter of a second. */
export function focusSoon(id: string, otherwise: readonly string[] = [], tries = 15): void {
  requestAnimationFrame(() => {
    const found =
      document.getElementById(id) ??
      (tries < 8 ? otherwise.map((one) => document.getElementById(one)).find(Boolean) : null);
    if (!found) {
      if (tries > 0) focusSoon(id, otherwise, tries - 1);
      return;
    }
    // A field inside a closed fold cannot take the caret.
    found.closest('details')?.setAttribute('open', '');
    found.focus({ preventScroll: true });
    found.scrollIntoView({ block: 'nearest' });
  });
}
