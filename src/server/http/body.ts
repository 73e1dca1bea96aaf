import { malformed, Refusal, tooLarge } from '../refusal';

/** Largest JSON body, in bytes: a text of 64 KB, escaped, with its reason. */
export const BODY_LIMIT = 100 * 1024;

const overLimit = () => tooLarge(`A request may carry ${BODY_LIMIT / 1024} KB at most. Send less.`);

/** Bytes of the body, read no further than the limit, whatever `Content-Length` says or leaves out. */
async function readBytes(request: Request): Promise<Uint8Array> {
  if (Number(request.headers.get('content-length') ?? 0) > BODY_LIMIT) throw overLimit();
  if (!request.body) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > BODY_LIMIT) {
      await reader.cancel();
      throw overLimit();
    }
    chunks.push(value);
  }
  return Buffer.concat(chunks, size);
}

/**
 * The text and the value of a JSON body.
 * Refuses 413 over the limit, 415 another content type, 400 what is no JSON in UTF-8 or nothing at all.
 */
export async function readJson(request: Request): Promise<{ text: string; value: unknown }> {
  const bytes = await readBytes(request);
  const type = (request.headers.get('content-type') ?? '').split(';')[0]?.trim().toLowerCase() ?? '';
  if (bytes.byteLength > 0 && !/^application\/([a-z0-9.+-]+\+)?json$/.test(type))
    throw new Refusal(415, 'not-json', 'Not JSON', 'Send the body as JSON, with Content-Type: application/json.');
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return { text, value: JSON.parse(text) };
  } catch {
    throw malformed(
      bytes.byteLength > 0 ? 'The body is not JSON in UTF-8.' : 'The body is empty; this call needs a JSON body.',
    );
  }
}
