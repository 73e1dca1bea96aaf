import { readAudit } from '@/domain/api/operations/history';
import { readAudit as read } from '@/server/audit/read';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(readAudit, async ({ actor, query }) => ({ body: await read(actor, query) })),
});
