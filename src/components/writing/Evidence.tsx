import { useState } from 'react';
import { ask, Refused } from '@/components/api/ask';
import { PhotoPicker } from '@/components/photos/PhotoPicker';
import { PhotoStrip } from '@/components/photos/PhotoStrip';
import { usePhotoPicks } from '@/components/photos/usePhotoPicks';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { Photo, PhotoList } from '@/domain/api/schemas/photos';
import { MOST_PHOTOS } from '@/domain/photos/photos';

const wordsOf = (error: unknown) =>
  error instanceof Refused
    ? (error.problem.errors?.[0]?.message ?? error.problem.detail)
    : 'There was no answer. Try again; nothing happens twice.';

/** Photos that belong to the reason: what was seen, for the editor who was not there. */
export function Evidence({ proposalId, photos: first }: { proposalId: string; photos: readonly Photo[] }) {
  const [photos, setPhotos] = useState(first);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [pending, setPending] = useState(false);
  const standing = photos.filter(({ removed }) => removed === null).length;
  const picks = usePhotoPicks([], MOST_PHOTOS - standing);
  const attempt = async (act: () => Promise<void>) => {
    setTrouble(null);
    setPending(true);
    try {
      await act();
    } catch (error) {
      setTrouble(wordsOf(error));
    } finally {
      setPending(false);
    }
  };
  const add = () => {
    const chosen = picks.ready();
    if (!chosen) return;
    void attempt(async () => {
      const { items } = await ask<PhotoList>('POST', `/proposals/${proposalId}/photos`, {
        body: { photos: chosen },
        key: crypto.randomUUID(),
      });
      setPhotos(items);
      picks.clear();
    });
  };
  const takeOff = (id: string) =>
    void attempt(async () => {
      await ask('DELETE', `/photos/${id}`);
      setPhotos((all) => all.filter((photo) => photo.id !== id));
    });
  const many = picks.picks.length;
  return (
    <section aria-labelledby="evidence" className="mt-4 flex flex-col gap-2.5" {...picks.catching}>
      <div>
        <h3 id="evidence" className="font-sans text-base font-medium">
          Photos that show it
        </h3>
        <p className="text-small text-ink-2">They stand under the reason; none is needed.</p>
      </div>
      <PhotoStrip photos={photos} onTakeOff={takeOff} />
      <PhotoPicker picks={picks} />
      {trouble && (
        <Notice live="alert" title="Not done">
          <p>{trouble}</p>
        </Notice>
      )}
      {many > 0 && (
        <div>
          <Button kind="main" pending={pending} pendingText="Adding" onClick={add}>
            {many === 1 ? 'Add the photo to the reason' : `Add ${many} photos to the reason`}
          </Button>
        </div>
      )}
    </section>
  );
}
