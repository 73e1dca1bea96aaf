import { readVersion } from '@/domain/api/operations/versions';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { readVersion as read } from '@/server/review/versions/read';

export const { GET, ALL } = route({
  GET: endpoint(readVersion, async ({ actor, params }) => ({ body: await read(actor, params.id, params.n) })),
});
