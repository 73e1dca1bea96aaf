import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { LARGEST_FILE } from '@/domain/photos/photos';

/** A photo that was chosen to be sent with something. */
export interface Pick {
  /** Ours, for lists and for a second try. */
  key: string;
  /** Name of the file; empty for one that was uploaded before. */
  name: string;
  state: 'waiting' | 'sending' | 'there' | 'failed';
  /** Of its bytes that have gone out, 0 to 1. */
  share: number;
  /** Why it failed, in words. */
  error: string | null;
  /** Whether trying the same file again can help. */
  again: boolean;
  photo: UploadedPhoto | null;
  /** What it shows. */
  alt: string;
}

export const uploadedPick = (photo: UploadedPhoto): Pick => ({
  key: photo.id,
  name: '',
  state: 'there',
  share: 1,
  error: null,
  again: false,
  photo,
  alt: photo.alt,
});

const MEGABYTE = 1024 * 1024;
/** "18 MB"; rounded down, what is just over the limit would read as if it were allowed. */
const sizeOf = (bytes: number) =>
  bytes < LARGEST_FILE + MEGABYTE ? 'more than 15 MB' : `${Math.floor(bytes / MEGABYTE)} MB`;

/** A file as it was chosen. One that is too large is not sent at all: it would only be refused at the end. */
export function chosenPick(file: File, key: string): Pick {
  const over = file.size > LARGEST_FILE;
  return {
    key,
    name: file.name,
    state: over ? 'failed' : 'waiting',
    share: 0,
    error: over ? `It has ${sizeOf(file.size)}; 15 MB is the most. Choose a smaller one.` : null,
    again: false,
    photo: null,
    alt: '',
  };
}

/** How far it has come, as the page says it. */
export function progressOf({ state, share }: Pick): string {
  if (state === 'waiting') return 'Waits for its turn';
  // All bytes are out; the server turns it upright and scales it.
  return share >= 1 ? 'Sent, being prepared' : `Sending, ${Math.floor(share * 100)} %`;
}

/** Why what the photos belong to cannot be sent yet; null where it can. `key` names a photo that lacks its words. */
export function holdUp(picks: readonly Pick[]): { said: string; key: string | null } | null {
  if (picks.some(({ state }) => state === 'failed'))
    return { said: 'A photo could not be sent. Try it again or take it off.', key: null };
  if (picks.some(({ state }) => state !== 'there'))
    return { said: 'A photo is still on its way. Wait until it is there, or take it off.', key: null };
  const bare = picks.find(({ alt }) => alt.trim() === '');
  return bare ? { said: 'Say what the photo shows, for whoever cannot see it.', key: bare.key } : null;
}

/** The pictures among what was pasted or dropped. */
export const picturesIn = (data: DataTransfer | null): File[] =>
  [...(data?.files ?? [])].filter(({ type }) => type.startsWith('image/'));
