import { listBulletins } from '@/domain/api/operations/bulletins';
import { page } from '@/domain/api/page';
import * as bulletins from '@/server/bulletins/read';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(listBulletins, async ({ actor, query }) => ({
    body: page(await bulletins.listBulletins(actor), query, ({ id }) => id),
  })),
});
