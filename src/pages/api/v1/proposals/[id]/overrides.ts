import { overrideClampCheck } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { overrideClamp } from '@/server/review/override';

export const { POST, ALL } = route({
  POST: endpoint(overrideClampCheck, async ({ actor, params, body, version }) =>
    tagged(await overrideClamp(actor, params.id, body, version)),
  ),
});
