import { useEffect, useRef } from 'react';
import { PhotoPicker } from '@/components/photos/PhotoPicker';
import { picturesIn } from '@/components/photos/picks';
import { usePhotoPicks } from '@/components/photos/usePhotoPicks';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';

/** Adds photos to the plain form around it: they are uploaded here, and the form sends their names and words along. */
export function FlagPhotos({ kept }: { kept: readonly UploadedPhoto[] }) {
  const picks = usePhotoPicks(kept);
  const place = useRef<HTMLDivElement>(null);
  const now = useRef(picks);
  useEffect(() => {
    now.current = picks;
  });
  useEffect(() => {
    const form = place.current?.closest('form');
    const onSubmit = (event: Event) => {
      if (now.current.ready() === null) event.preventDefault();
    };
    const take = (event: Event, data: DataTransfer | null) => {
      const pictures = picturesIn(data);
      if (pictures.length === 0) return;
      event.preventDefault();
      now.current.add(pictures);
    };
    const onPaste = (event: ClipboardEvent) => take(event, event.clipboardData);
    const onDragOver = (event: DragEvent) => {
      if (event.dataTransfer?.types.includes('Files')) event.preventDefault();
    };
    const onDrop = (event: DragEvent) => take(event, event.dataTransfer);
    form?.addEventListener('submit', onSubmit);
    form?.addEventListener('paste', onPaste);
    form?.addEventListener('dragover', onDragOver);
    form?.addEventListener('drop', onDrop);
    return () => {
      form?.removeEventListener('submit', onSubmit);
      form?.removeEventListener('paste', onPaste);
      form?.removeEventListener('dragover', onDragOver);
      form?.removeEventListener('drop', onDrop);
    };
  }, []);
  return (
    <div ref={place} data-needs-script className="flex flex-col gap-1.5">
      <p className="font-medium">Photos</p>
      <PhotoPicker picks={picks} />
    </div>
  );
}
