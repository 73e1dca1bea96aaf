import { declineProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { decline } from '@/server/review/giveBack';

export const { POST, ALL } = route({
  POST: endpoint(declineProposal, async ({ actor, params, version, body }) =>
    tagged(await decline(actor, params.id, body, version)),
  ),
});
