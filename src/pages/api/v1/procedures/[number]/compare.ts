import { compareRevisions } from '@/domain/api/operations/book';
import { compareRevisions as compare } from '@/server/book/compare';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(compareRevisions, async ({ actor, params, query }) => {
    const { from, to, comparison } = await compare(actor, params.number, query.from, query.to);
    return { body: { from, to, comparison } };
  }),
});
