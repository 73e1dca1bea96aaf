import { may, type Actor, type Book } from '../people/may';

/** Bytes of one file as it is sent: a phone's photo has 3 to 12 MB. */
export const LARGEST_FILE = 15 * 1024 * 1024;
/** Pixels that are kept. A larger picture is scaled down: what it shows can still be read off a print. */
export const KEPT_PIXELS = 12_000_000;
/** Pixels that are read at most. Phones make 12 to 50 million; what claims more is refused before it is unpacked. */
export const READ_PIXELS = 64_000_000;
/** Longest side of the small picture that stands in a thread. */
export const SMALL_SIDE = 480;

/** Photos of one message, one flag, or the reason of one proposal. */
export const MOST_PHOTOS = 6;
/** Files that the form of a flag takes in one go where no script runs. */
export const FORM_PHOTOS = 3;
/** Characters of the words that say what a photo shows. */
export const LONGEST_ALT = 200;
/** Characters of the reason why one was removed. */
export const LONGEST_REASON = 500;
/** Photos that one person may have uploaded and not yet sent with anything. */
export const MOST_WAITING = 40;
/** One that was never sent is thrown away after a day. */
export const KEPT_UNSENT_MS = 24 * 60 * 60 * 1000;
/** How long whoever sent a photo may remove it without being an editor. */
export const OWN_REMOVAL_MS = 10 * 60 * 1000;

/** What a photo is evidence in. A kind of thing that takes photos is added here and in the trigger of its table. */
export const PHOTO_SUBJECTS = ['message', 'flag', 'proposal'] as const;
export type PhotoSubject = (typeof PHOTO_SUBJECTS)[number];

/** What a browser offers to choose from. HEIC is offered too, so that a phone converts it or we can say how. */
export const FILE_TYPES = 'image/*';

const MAKE_JPEG =
  'On an iPhone choose Settings, Camera, Formats, Most compatible, and take it again; or open it, take a picture of the screen and send that.';

/**
 * Why a file of that type is not taken; null where it is. HEIC is compressed with HEVC, which our decoder does not read; AVIF
 * has the same wrapping and is read.
 *
 * @param mime as found in the bytes; null where they tell nothing
 */
export function refusedType(mime: string | null): string | null {
  switch (mime) {
    case 'image/jpeg':
    case 'image/png':
    case 'image/webp':
    case 'image/avif':
      return null;
    case 'image/heic':
    case 'image/heif':
    case 'image/heic-sequence':
    case 'image/heif-sequence':
      return `This is a HEIC picture, which cannot be read here. Send it as JPEG. ${MAKE_JPEG}`;
    default:
      return 'This is no photo that can be read here. Send a JPEG, PNG, WebP or AVIF picture.';
  }
}

/** Width and height within the pixels that are kept, with the same proportions. */
export function keptSize(width: number, height: number): { width: number; height: number } {
  const scale = Math.min(1, Math.sqrt(KEPT_PIXELS / (width * height)));
  const side = (length: number) => Math.max(1, Math.floor(length * scale));
  return { width: side(width), height: side(height) };
}

/** What the rules ask of a photo that was sent with something. */
export interface SentPhoto {
  /** Of what it was sent with. */
  book: Book;
  uploaderId: string;
  attachedAt: string;
  removed: boolean;
  /** Nobody but its uploader has seen it: it stands at a reason that was not sent in since. */
  unsent: boolean;
}

export type PhotoVerdict = { ok: true } | { ok: false; kind: 'forbidden' | 'conflict'; why: string };

/** Takes a photo off before anybody else saw it: it leaves nothing behind. */
export const mayTakeOff = (actor: Actor, photo: SentPhoto): boolean =>
  photo.unsent && !photo.removed && actor.personId === photo.uploaderId;

/**
 * Removes a photo that was sent, with a reason that stays. An editor of the book may; so may whoever sent it, for the ten
 * minutes in which a wrong one is noticed.
 *
 * @param at ISO 8601 in UTC
 */
export function mayRemove(actor: Actor, photo: SentPhoto, at: string): PhotoVerdict {
  const own = actor.personId === photo.uploaderId;
  const permission = may(actor, 'removePhoto', { book: photo.book });
  const inTime = Date.parse(at) - Date.parse(photo.attachedAt) <= OWN_REMOVAL_MS;
  if (!permission.ok && !own) return { ok: false, kind: 'forbidden', why: permission.why };
  if (photo.removed) return { ok: false, kind: 'conflict', why: 'This photo was removed already.' };
  if (permission.ok || inTime) return { ok: true };
  return {
    ok: false,
    kind: 'forbidden',
    why: 'You sent this photo more than ten minutes ago. Ask an editor of the book to remove it.',
  };
}
