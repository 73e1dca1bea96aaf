import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Notice } from '@/components/ui/Notice';
import { TextArea } from '@/components/ui/TextArea';
import type { Photo } from '@/domain/api/schemas/photos';
import { PhotoStrip } from './PhotoStrip';

/** Asks why a photo that was sent is to go. A plain form. */
export function RemovePhoto({
  photo,
  href,
  reason,
  error,
}: {
  photo: Photo;
  href: string;
  reason: string;
  error: string | undefined;
}) {
  return (
    <form method="post" className="flex flex-col gap-5 px-4 py-6 sm:px-9 sm:py-7">
      <PhotoStrip photos={[{ ...photo, may: { takeOff: false, remove: false } }]} />
      {photo.may.remove ? (
        <>
          <TextArea
            name="reason"
            label="Why it goes"
            hint="For example: it shows a customer's number plate."
            fieldClass="max-w-[38rem]"
            rows={3}
            maxLength={500}
            error={error}
            defaultValue={reason}
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" kind="main">
              Remove the photo
            </Button>
            <ButtonLink href={href}>Keep it</ButtonLink>
          </div>
        </>
      ) : (
        <Notice className="max-w-prose">
          <p>An editor of the book removes a photo, and for ten minutes whoever sent it.</p>
        </Notice>
      )}
    </form>
  );
}
