import { listRevisions } from '@/domain/api/operations/book';
import { readRevisions } from '@/server/book/history';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(listRevisions, async ({ actor, params, query }) => ({
    body: await readRevisions(actor, params.number, query),
  })),
});
