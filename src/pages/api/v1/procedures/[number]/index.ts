import { readProcedure } from '@/domain/api/operations/book';
import { readSheet, readSheetKey } from '@/server/book/sheet';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(readProcedure, async ({ actor, params, holds }) => {
    const { tag } = await readSheetKey(actor, params.number);
    if (holds(tag)) return { notModified: tag };
    return { body: await readSheet(actor, params.number), tag };
  }),
});
