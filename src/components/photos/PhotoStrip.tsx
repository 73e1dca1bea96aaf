import { useState, type CSSProperties } from 'react';
import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import type { Photo } from '@/domain/api/schemas/photos';
import { SMALL_SIDE } from '@/domain/photos/photos';
import { PhotoViewer } from './PhotoViewer';

/** Size of the small picture, so that nothing moves when it comes. */
function smallSize({ width, height }: Photo): { width: number; height: number } {
  const scale = Math.min(1, SMALL_SIDE / Math.max(width, height));
  return { width: Math.round(width * scale), height: Math.round(height * scale) };
}

const Removed = ({ removed }: { removed: NonNullable<Photo['removed']> }) => (
  <li className="photo-removed">
    Photo removed by {removed.person.name} on {dayOf(removed.at)}, because: {removed.reason}
  </li>
);

const RemoveLink = ({ id, number }: { id: string; number: number }) => (
  <a href={`/photos/${id}/remove`} className="photo-remove">
    Remove<span className="sr-only"> photo {number}</span>
  </a>
);

/**
 * The photos of a message, a flag or a reason. Each opens large in place; without a script it opens as a page.
 *
 * @param plain the page around it has no script, so removing stands beside each photo
 */
export function PhotoStrip({
  photos,
  plain = false,
  onTakeOff,
}: {
  photos: readonly Photo[];
  plain?: boolean;
  /** Takes one off that nobody has seen yet. */
  onTakeOff?: (id: string) => void;
}) {
  const [open, setOpen] = useState<number | null>(null);
  const shown = photos.filter(({ removed }) => removed === null);
  if (photos.length === 0) return null;
  return (
    <>
      <ul className="photo-strip">
        {photos.map((photo) => {
          if (photo.removed) return <Removed key={photo.id} removed={photo.removed} />;
          const at = shown.indexOf(photo);
          return (
            <li key={photo.id} style={{ '--ratio': photo.width / photo.height } as CSSProperties}>
              <a
                href={photo.url}
                onClick={(event) => {
                  if (event.metaKey || event.ctrlKey || event.shiftKey) return;
                  event.preventDefault();
                  setOpen(at);
                }}
              >
                <img src={photo.small} alt={photo.alt} {...smallSize(photo)} decoding="async" />
              </a>
              {/* The picture's own words say it to ears. */}
              <span aria-hidden="true" className="photo-words">
                {photo.alt}
              </span>
              {photo.may.takeOff && onTakeOff && (
                <Button kind="quiet" className="photo-take-off" onClick={() => onTakeOff(photo.id)}>
                  Take off<span className="sr-only"> photo {at + 1}</span>
                </Button>
              )}
              {photo.may.remove &&
                (plain ? (
                  <RemoveLink id={photo.id} number={at + 1} />
                ) : (
                  <noscript>
                    <RemoveLink id={photo.id} number={at + 1} />
                  </noscript>
                ))}
            </li>
          );
        })}
      </ul>
      {open !== null && shown[open] && (
        <PhotoViewer photos={shown} at={open} onGo={setOpen} onClose={() => setOpen(null)} />
      )}
    </>
  );
}
