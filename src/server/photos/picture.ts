import { createHash } from 'node:crypto';
import { fileTypeFromFile } from 'file-type';
import sharp from 'sharp';
import { keptSize, READ_PIXELS, refusedType, SMALL_SIDE } from '@/domain/photos/photos';
import { invalid, Refusal } from '../refusal';
import { inTurn } from './turns';

/** A picture as it is kept: upright, at most 12 megapixels, JPEG in sRGB, with nothing in it but the picture. */
export interface Picture {
  full: Buffer;
  small: Buffer;
  width: number;
  height: number;
  /** SHA-256 of `full`, in hex. */
  hash: string;
}

// One picture is worked on by one thread, and nothing of it stays behind.
sharp.concurrency(1);
sharp.cache(false);

/** Longest that one picture is worked on, in seconds. */
const WORK_SECONDS = 20;

/** The name that sharp gives to each type that is taken: what it reads must be what the bytes began with. */
const FORMATS: Record<string, string> = {
  'image/jpeg': 'jpeg',
  'image/png': 'png',
  'image/webp': 'webp',
  'image/avif': 'heif',
};

const wrong = (message: string) => invalid(message, [{ path: 'photo', message }]);
const damaged = () =>
  wrong('The picture is damaged or cut off and cannot be read. Send it again, or take another one.');

/** What the bytes say they are, whatever the name or the sender says. Refuses 415 what is not taken. */
async function typeOf(path: string): Promise<string> {
  const found = await fileTypeFromFile(path).catch(() => undefined);
  const mime = found?.mime ?? null;
  const why = refusedType(mime);
  if (why !== null || mime === null)
    throw new Refusal(415, 'not-a-photo', 'No photo', why ?? '', { errors: [{ path: 'photo', message: why ?? '' }] });
  return mime;
}

/** Size as it stands upright, read from the head of the file; the picture itself is not unpacked. */
async function measure(path: string, mime: string): Promise<{ width: number; height: number }> {
  // Without the limit only here, to tell how many there are.
  const head = await sharp(path, { limitInputPixels: false }).metadata().catch(tooLongOrDamaged);
  if (head.format !== FORMATS[mime]) throw damaged();
  const pixels = head.width * head.height;
  if (pixels > READ_PIXELS) throw tooManyPixels(pixels);
  return head.autoOrient;
}

const tooManyPixels = (pixels: number) =>
  wrong(
    `This picture has ${Math.round(pixels / 1e6)} megapixels; ${READ_PIXELS / 1e6} are read at most. Send a smaller one.`,
  );

function tooLongOrDamaged(error: unknown): never {
  if (error instanceof Error && /timeout/i.test(error.message))
    throw wrong('This picture takes too long to read. Send a smaller one, or a JPEG.');
  throw damaged();
}

const jpeg = (quality: number) => ({ quality, chromaSubsampling: '4:2:0' });

/**
 * Reads a picture from a file and writes it anew: orientation applied, scaled to 12 megapixels, on white, in sRGB. What a
 * camera or a program noted in it (EXIF with its place, XMP, IPTC, colour profiles, comments) and whatever was hung on behind is
 * not carried over.
 *
 * Refuses 415 what is no picture that is taken, 422 one that is damaged or has too many pixels, 503 where the line is long.
 */
export async function makePicture(path: string): Promise<Picture> {
  const mime = await typeOf(path);
  return inTurn(async () => {
    const upright = await measure(path, mime);
    const size = keptSize(upright.width, upright.height);
    try {
      const { data: full, info } = await sharp(path, { limitInputPixels: READ_PIXELS, failOn: 'error' })
        .autoOrient()
        .resize({ ...size, fit: 'fill' })
        .flatten({ background: '#ffffff' })
        .toColourspace('srgb')
        .jpeg(jpeg(82))
        .timeout({ seconds: WORK_SECONDS })
        .toBuffer({ resolveWithObject: true });
      const small = await sharp(full)
        .resize({ width: SMALL_SIDE, height: SMALL_SIDE, fit: 'inside', withoutEnlargement: true })
        .jpeg(jpeg(78))
        .toBuffer();
      return {
        full,
        small,
        width: info.width,
        height: info.height,
        hash: createHash('sha256').update(full).digest('hex'),
      };
    } catch (error) {
      return tooLongOrDamaged(error);
    }
  });
}
