import { submitProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { submit } from '@/server/review/submit';

export const { POST, ALL } = route({
  POST: endpoint(submitProposal, async ({ actor, params, version }) => tagged(await submit(actor, params.id, version))),
});
