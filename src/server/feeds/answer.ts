import { createHash } from 'node:crypto';
import { asRefusal } from '../refusal';
import { readFeed } from './document';

/** The key stands in the address: no page it leads to may learn it, and no search engine keep it. */
const HEADERS = {
  'cache-control': 'private, no-cache',
  'referrer-policy': 'no-referrer',
  'x-robots-tag': 'noindex, nofollow',
};

const tagOf = (text: string) => `W/"${createHash('sha256').update(text).digest('base64url').slice(0, 22)}"`;

const holds = (header: string | null, tag: string) =>
  header?.split(',').some((one) => ['*', tag, tag.slice(2)].includes(one.trim())) ?? false;

/**
 * Answers a fetch of a feed. Whatever is refused is told in a line of plain text, never on a page: an error page would
 * name the address, and a feed reader shows none.
 *
 * @param address of whoever asks
 */
export async function answerFeed(key: string, request: Request, url: URL, address: string): Promise<Response> {
  try {
    const document = await readFeed(key, url, address);
    const etag = tagOf(document);
    if (holds(request.headers.get('if-none-match'), etag))
      return new Response(null, { status: 304, headers: { ...HEADERS, etag } });
    return new Response(document, {
      headers: { ...HEADERS, etag, 'content-type': 'application/atom+xml; charset=utf-8' },
    });
  } catch (error) {
    const { status, detail, headers, cause } = asRefusal(error);
    if (status >= 500) console.error(cause);
    return new Response(`${detail}\n`, {
      status,
      headers: { ...headers, ...HEADERS, 'content-type': 'text/plain; charset=utf-8' },
    });
  }
}
