import { listVersions, setAside } from '@/domain/api/operations/versions';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { listVersions as list } from '@/server/review/versions/read';
import { setAside as aside } from '@/server/review/versions/setAside';

export const { GET, POST, ALL } = route({
  GET: endpoint(listVersions, async ({ actor, params, query }) => ({ body: await list(actor, params.id, query) })),
  POST: endpoint(setAside, async ({ actor, params, body }) => {
    await aside(actor, params.id, body);
    return { body: undefined };
  }),
});
