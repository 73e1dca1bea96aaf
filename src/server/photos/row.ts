import type { UploadedPhoto } from '@/domain/api/schemas/photos';

/** Names in the file store, from our own id alone. */
export const fullKey = (id: string) => `photos/${id}.jpg`;
export const smallKey = (id: string) => `photos/${id}-small.jpg`;

export const PHOTO_TYPE = 'image/jpeg';

/** A photo with its addresses on this site. */
export const photoOf = ({
  id,
  width,
  height,
  bytes,
  alt,
}: Pick<UploadedPhoto, 'id' | 'width' | 'height' | 'bytes' | 'alt'>): UploadedPhoto => ({
  id,
  width,
  height,
  bytes,
  alt,
  url: `/photos/${id}`,
  small: `/photos/${id}/small`,
});
