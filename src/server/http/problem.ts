import type { Refusal } from '../refusal';

/** A refusal as an RFC 9457 problem document. */
export function problemResponse(refusal: Refusal, requestId: string): Response {
  const { type, title, status, detail, errors, extra } = refusal;
  const headers = new Headers({
    'content-type': 'application/problem+json',
    'cache-control': 'no-store',
    'x-request-id': requestId,
    ...refusal.headers,
  });
  // Only a fault of ours names its request, so that equal refusals stay equal to the byte.
  const instance = status >= 500 ? { instance: `urn:uuid:${requestId}` } : {};
  const body = { type, title, status, detail, ...instance, ...(errors?.length ? { errors } : {}), ...extra };
  return new Response(JSON.stringify(body), { status, headers });
}
