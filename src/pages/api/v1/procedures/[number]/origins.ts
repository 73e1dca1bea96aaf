import { readOrigins } from '@/domain/api/operations/history';
import { readOrigins as read } from '@/server/book/origins';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(readOrigins, async ({ actor, params }) => ({ body: await read(actor, params.number) })),
});
