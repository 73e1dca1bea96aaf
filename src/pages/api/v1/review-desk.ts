import { readDesk } from '@/domain/api/operations/proposals';
import { page } from '@/domain/api/page';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { onDesk, readDesk as read } from '@/server/review/readDesk';

export const { GET, ALL } = route({
  GET: endpoint(readDesk, async ({ actor, query }) => {
    const { items, next } = page(await read(actor), query, ({ id }) => id);
    return { body: { items: await onDesk(actor, items), next } };
  }),
});
