import { publishProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { publish } from '@/server/review/publish';

export const { POST, ALL } = route({
  POST: endpoint(publishProposal, async ({ actor, params, version }) =>
    tagged(await publish(actor, params.id, version)),
  ),
});
