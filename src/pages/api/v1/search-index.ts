import { readSearchIndex } from '@/domain/api/operations/search';
import { acceptedEncoding } from '@/server/book/compressed';
import { searchIndex } from '@/server/book/search';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(readSearchIndex, async ({ actor, holds, context }) => {
    const { etag, index } = await searchIndex(actor);
    if (holds(etag)) return { notModified: etag };
    const encoding = acceptedEncoding(context.request.headers.get('accept-encoding'));
    return { bytes: await index.as(encoding), encoding, tag: etag };
  }),
});
