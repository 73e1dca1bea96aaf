import { useRef, useState, type ClipboardEvent, type DragEvent } from 'react';
import { ask, Refused } from '@/components/api/ask';
import { sendPhoto, type Sending } from '@/components/api/sendPhoto';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { MOST_PHOTOS } from '@/domain/photos/photos';
import { chosenPick, holdUp, picturesIn, uploadedPick, type Pick } from './picks';

/** Why a photo was not taken, and whether the same file can be tried again. */
function faultOf(error: unknown): { error: string; again: boolean } {
  if (!(error instanceof Refused)) return { error: 'There was no answer. Try again.', again: true };
  if (error.status === 401)
    return { error: 'You are signed out. Sign in again in another tab, then try again.', again: true };
  const final = [400, 403, 413, 415, 422].includes(error.status);
  return { error: error.problem.errors?.[0]?.message ?? error.problem.detail, again: !final };
}

/** What cannot be dropped into a page must not make the browser leave it either. */
const carriesFiles = ({ dataTransfer }: DragEvent) => dataTransfer.types.includes('Files');

/**
 * Photos that are chosen for a message: each is uploaded at once, one after the other, so that it is there by the time the words
 * are written. They stay through a failed sending.
 *
 * @param first that were uploaded before, where the page came back
 */
export function usePhotoPicks(first: readonly UploadedPhoto[] = [], most = MOST_PHOTOS) {
  const [picks, setPicks] = useState<Pick[]>(() => first.map(uploadedPick));
  const [said, setSaid] = useState<{ said: string; key: string | null } | null>(null);
  const files = useRef(new Map<string, File>());
  const running = useRef(new Map<string, Sending>());
  const line = useRef<Promise<unknown>>(Promise.resolve());

  const set = (key: string, change: Partial<Pick>) =>
    setPicks((all) => all.map((pick) => (pick.key === key ? { ...pick, ...change } : pick)));

  const send = async (key: string) => {
    const file = files.current.get(key);
    if (!file) return;
    set(key, { state: 'sending', share: 0, error: null });
    const sending = sendPhoto(file, key, (share) => set(key, { share }));
    running.current.set(key, sending);
    try {
      set(key, { state: 'there', share: 1, photo: await sending.done });
    } catch (error) {
      set(key, { state: 'failed', ...faultOf(error) });
    } finally {
      running.current.delete(key);
    }
  };
  const queue = (key: string) => {
    line.current = line.current.then(() => send(key));
  };
  const add = (chosen: readonly File[]) => {
    const room = Math.max(0, most - picks.length);
    const fresh = chosen.slice(0, room).map((file) => ({ file, pick: chosenPick(file, crypto.randomUUID()) }));
    setSaid(chosen.length > room ? { said: `${most} photos fit here; the rest was left out.`, key: null } : null);
    setPicks((all) => [...all, ...fresh.map(({ pick }) => pick)]);
    for (const { file, pick } of fresh) {
      files.current.set(pick.key, file);
      if (pick.state === 'waiting') queue(pick.key);
    }
  };
  const forget = (gone: readonly Pick[]) => {
    for (const { key, photo } of gone) {
      files.current.delete(key);
      running.current.get(key)?.abort();
      // Where this fails, it is thrown away after a day.
      if (photo) void ask('DELETE', `/photos/${photo.id}`).catch(() => undefined);
    }
  };
  return {
    picks,
    most,
    said,
    add,
    again: (key: string) => {
      setSaid(null);
      set(key, { state: 'waiting', share: 0, error: null });
      queue(key);
    },
    takeOff: (key: string) => {
      setSaid(null);
      forget(picks.filter((pick) => pick.key === key));
      setPicks((all) => all.filter((pick) => pick.key !== key));
    },
    describe: (key: string, alt: string) => {
      setSaid((now) => (now?.key === key ? null : now));
      set(key, { alt });
    },
    /** What to send along; null, and the reason on the screen, while something is amiss. */
    ready: (): { id: string; alt: string }[] | null => {
      const held = holdUp(picks);
      setSaid(held);
      if (held?.key) document.getElementById(`what-${held.key}`)?.focus();
      return held ? null : picks.flatMap(({ photo, alt }) => (photo ? [{ id: photo.id, alt: alt.trim() }] : []));
    },
    /** They were sent, and belong to what they were sent with. */
    clear: () => {
      setPicks([]);
      setSaid(null);
    },
    /** They are not sent after all. */
    drop: () => {
      forget(picks);
      setPicks([]);
      setSaid(null);
    },
    /** For the form: takes pictures that are dropped or pasted on it. */
    catching: {
      onPaste: (event: ClipboardEvent) => {
        const pictures = picturesIn(event.clipboardData);
        if (pictures.length === 0) return;
        event.preventDefault();
        add(pictures);
      },
      onDragOver: (event: DragEvent) => {
        if (carriesFiles(event)) event.preventDefault();
      },
      onDrop: (event: DragEvent) => {
        if (!carriesFiles(event)) return;
        event.preventDefault();
        add(picturesIn(event.dataTransfer));
      },
    },
  };
}
export type PhotoPicks = ReturnType<typeof usePhotoPicks>;
