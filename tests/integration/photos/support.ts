import type { APIContext } from 'astro';
import { servePhoto } from '@/server/photos/serve';
import { call, type Answered } from '../api/support/call';
import { signedIn, type Member } from '../api/support/network';

/** Uploads a file as a form does. */
export function upload(
  as: Member | null,
  bytes: Buffer | string,
  { name = 'photo.jpg', type = 'image/jpeg', alt = 'A gasket corner', headers = {} as Record<string, string> } = {},
): Promise<Answered> {
  const form = new FormData();
  form.append('alt', alt);
  form.append('photo', new Blob([typeof bytes === 'string' ? bytes : new Uint8Array(bytes)], { type }), name);
  return sendForm(as, '/photos', form, headers);
}

export async function sendForm(as: Member | null, path: string, form: FormData, headers: Record<string, string> = {}) {
  // The boundary stands in the header that `Request` makes of a form.
  const made = new Request('http://book.test/', { method: 'POST', body: form });
  const raw = await made.arrayBuffer();
  return call(as, 'POST', path, {
    raw,
    headers: { 'content-type': made.headers.get('content-type') ?? '', ...headers },
  });
}

/** The picture, as the page of its address serves it; its status where it is refused. */
export async function picture(
  as: Member,
  id: string,
  size: 'full' | 'small' = 'full',
  headers: Record<string, string> = {},
) {
  const { actor } = await signedIn(as);
  const request = new Request(`http://book.test/photos/${id}`, { headers });
  return servePhoto(actor, request, id, size) as Promise<Response> & Partial<APIContext>;
}

export const statusOf = (answer: Promise<Response>): Promise<number> =>
  answer.then(
    ({ status }) => status,
    (error: { status?: number }) => error.status ?? 500,
  );

/** Removes a photo that was sent. */
export const remove = (as: Member, id: string, reason = 'It shows a customer.') =>
  call(as, 'POST', `/photos/${id}/remove`, { body: { reason } });

/** Asks about a proposal as a whole, with photos. */
export const ask = (as: Member, proposal: string, photos: unknown[], words = 'Is this the corner?') =>
  call(as, 'POST', `/proposals/${proposal}/threads`, { body: { kind: 'question', anchor: null, text: words, photos } });

/** That many minutes from now, ISO 8601 in UTC. */
export const minutes = (n: number) => new Date(Date.now() + n * 60_000).toISOString();
