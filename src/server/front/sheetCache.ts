import { createHash, randomBytes } from 'node:crypto';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';
import type { Me } from '@/domain/api/schemas/me';
import type { Actor } from '@/domain/people/may';
import { LRUCache } from 'lru-cache';
import { unreadKey } from '../bulletins/read';
import { readSheetKey } from '../book/sheet';

/**
 * Whole sheets, kept as they were sent. A sheet's page is a function of the sheet and of who reads it, so it is kept
 * under both: what decides the sheet (`readSheetKey`, read anew each time), what the frame shows of the person and which
 * bulletins that person has still to sign (`unreadKey`).
 * A publication, a proposal, a changed role or another unit system thus finds no entry and the page is made again.
 */

interface Kept {
  plain: Buffer<ArrayBuffer>;
  br: Buffer<ArrayBuffer>;
  gzip: Buffer<ArrayBuffer>;
  type: string;
}

const SHEET_PATH = /^\/procedures\/(P-\d{4,6})(?:\/revisions\/([A-Z]{1,2}))?\/?$/;
const kept = new LRUCache<string, Kept>({
  maxSize: 64 * 1024 * 1024,
  sizeCalculation: ({ plain, br, gzip }) => plain.length + br.length + gzip.length,
});
/** A new release may draw the same sheet otherwise; what was made before a start is not reused after it. */
const RUN = randomBytes(6).toString('hex');

const brotli = promisify(brotliCompress);
const gz = promisify(gzip);

const identity = (me: Me) => JSON.stringify([me.id, me.name, me.email, me.units, me.shortcuts, me.shop, me.roles]);

const encodingFor = (accepted: string): 'br' | 'gzip' | undefined =>
  /\bbr\b/.test(accepted) ? 'br' : /\bgzip\b/.test(accepted) ? 'gzip' : undefined;

function answer(entry: Kept, etag: string, accepted: string): Response {
  const encoding = encodingFor(accepted);
  return new Response(entry[encoding ?? 'plain'], {
    headers: {
      'content-type': entry.type,
      etag,
      vary: 'Accept-Encoding, Cookie',
      ...(encoding && { 'content-encoding': encoding }),
    },
  });
}

/**
 * Answers a request for a sheet from what is kept, or with 304, or makes the page with `render` and keeps it.
 * Resolves to undefined where the request is for something else. Refuses 404 like the sheet itself.
 */
export async function keptSheet(
  request: Request,
  url: URL,
  actor: Actor,
  me: Me,
  render: () => Promise<Response>,
): Promise<Response | undefined> {
  const match = SHEET_PATH.exec(url.pathname);
  if (!match?.[1] || url.search || request.method !== 'GET') return undefined;
  const { tag } = await readSheetKey(actor, match[1], match[2]);
  const unread = await unreadKey(actor);
  const key = createHash('sha256')
    .update(JSON.stringify([RUN, url.pathname, tag, identity(me), unread]))
    .digest('base64url');
  const etag = `W/"${key.slice(0, 22)}"`;
  if (request.headers.get('if-none-match') === etag) return new Response(null, { status: 304, headers: { etag } });
  const accepted = request.headers.get('accept-encoding') ?? '';
  const found = kept.get(key);
  if (found) return answer(found, etag, accepted);

  const page = await render();
  if (page.status !== 200) return page;
  const plain = Buffer.from(await page.arrayBuffer());
  const entry: Kept = {
    plain,
    br: await brotli(plain, { params: { [constants.BROTLI_PARAM_QUALITY]: 5 } }),
    gzip: await gz(plain),
    type: page.headers.get('content-type') ?? 'text/html; charset=utf-8',
  };
  kept.set(key, entry);
  return answer(entry, etag, accepted);
}
