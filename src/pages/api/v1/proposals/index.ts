import { listMyProposals } from '@/domain/api/operations/proposals';
import { page } from '@/domain/api/page';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { listMine } from '@/server/review/listMine';

export const { GET, ALL } = route({
  GET: endpoint(listMyProposals, async ({ actor, query }) => ({
    body: page(await listMine(actor), query, ({ id }) => id),
  })),
});
