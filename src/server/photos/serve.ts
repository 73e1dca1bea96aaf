import type { Actor } from '@/domain/people/may';
import { readFile } from '../files/store';
import { alreadyHeld } from '../http/preconditions';
import { notFound } from '../refusal';
import { fullKey, PHOTO_TYPE, smallKey } from './row';
import { seenPhoto } from './seen';

/**
 * The picture, through us and never from the store itself. It never changes under its address, so a browser may keep it; signing
 * out empties what it kept.
 *
 * Refuses 404 whoever may not see what it hangs on, and what was removed; 503 where the store fails.
 */
export async function servePhoto(
  actor: Actor,
  request: Request,
  id: string,
  size: 'full' | 'small',
): Promise<Response> {
  const photo = await seenPhoto(actor, id);
  if (photo.removed) throw notFound();
  const etag = `"${photo.hash.slice(0, 32)}${size === 'small' ? '-s' : ''}"`;
  const headers = {
    etag,
    'cache-control': 'private, max-age=31536000, immutable',
    vary: 'Cookie',
    'x-content-type-options': 'nosniff',
    // Opened on its own it is a picture and nothing else, whatever its bytes might be taken for.
    'content-security-policy': "default-src 'none'; sandbox",
  };
  if (alreadyHeld(request.headers, etag)) return new Response(null, { status: 304, headers });
  const bytes = await readFile(size === 'small' ? smallKey(id) : fullKey(id));
  return new Response(new Uint8Array(bytes), {
    headers: {
      ...headers,
      'content-type': PHOTO_TYPE,
      'content-length': String(bytes.length),
      'content-disposition': `inline; filename="photo-${id}${size === 'small' ? '-small' : ''}.jpg"`,
    },
  });
}
