import { listFlags } from '@/domain/api/operations/flags';
import { readFlags } from '@/server/flags/read';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(listFlags, async ({ actor }) => ({ body: await readFlags(actor) })),
});
