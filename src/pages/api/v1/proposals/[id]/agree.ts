import { agreeToProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { agree } from '@/server/review/agree';

export const { POST, ALL } = route({
  POST: endpoint(agreeToProposal, async ({ actor, params, version }) => tagged(await agree(actor, params.id, version))),
});
