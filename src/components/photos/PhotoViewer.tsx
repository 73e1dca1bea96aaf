import { useEffect } from 'react';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Dialog } from '@/components/ui/Dialog';
import type { Photo } from '@/domain/api/schemas/photos';

/** A photo as large as the window allows. Arrow keys go to its neighbours, Escape closes. */
export function PhotoViewer({
  photos,
  at,
  onGo,
  onClose,
}: {
  photos: readonly Photo[];
  at: number;
  onGo: (at: number) => void;
  onClose: () => void;
}) {
  const photo = photos[at];
  const many = photos.length > 1;
  const step = (by: number) => onGo((at + by + photos.length) % photos.length);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const by = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
      if (!by || photos.length < 2) return;
      event.preventDefault();
      onGo((at + by + photos.length) % photos.length);
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [at, photos.length, onGo]);
  if (!photo) return null;
  return (
    <Dialog
      open
      wide
      title={many ? `Photo ${at + 1} of ${photos.length}` : 'Photo'}
      onClose={onClose}
      actions={
        <>
          <Button kind="main" onClick={onClose}>
            Close
          </Button>
          {many && (
            <>
              <Button onClick={() => step(-1)}>Previous</Button>
              <Button onClick={() => step(1)}>Next</Button>
            </>
          )}
          <ButtonLink kind="quiet" href={photo.url} target="_blank" rel="noopener">
            Open the full picture
          </ButtonLink>
          {photo.may.remove && (
            <ButtonLink kind="quiet" href={`/photos/${photo.id}/remove`}>
              Remove it
            </ButtonLink>
          )}
        </>
      }
    >
      <figure className="photo-large" aria-live="polite">
        <img key={photo.id} src={photo.url} alt={photo.alt} width={photo.width} height={photo.height} />
        <figcaption aria-hidden="true">{photo.alt}</figcaption>
      </figure>
    </Dialog>
  );
}
