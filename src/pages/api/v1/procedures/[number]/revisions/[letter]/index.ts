import { readRevision } from '@/domain/api/operations/book';
import { readSheet, readSheetKey } from '@/server/book/sheet';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(readRevision, async ({ actor, params: { number, letter }, holds }) => {
    const { tag } = await readSheetKey(actor, number, letter);
    if (holds(tag)) return { notModified: tag };
    return { body: await readSheet(actor, number, letter), tag };
  }),
});
