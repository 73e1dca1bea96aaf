import { listRevisions } from '@/domain/api/operations/book';
import { page } from '@/domain/api/page';
import { readHistory } from '@/server/book/history';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(listRevisions, async ({ actor, params, query }) => ({
    body: page(await readHistory(actor, params.number), query, ({ letter }) => letter),
  })),
});
