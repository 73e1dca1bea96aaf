import { returnProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { returnToAuthor } from '@/server/review/giveBack';

export const { POST, ALL } = route({
  POST: endpoint(returnProposal, async ({ actor, params, version, body }) =>
    tagged(await returnToAuthor(actor, params.id, body, version)),
  ),
});
