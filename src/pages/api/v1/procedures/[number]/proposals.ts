import { startProposal } from '@/domain/api/operations/book';
import { endpoint } from '@/server/http/endpoint';
import { started } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { startProposal as start } from '@/server/review/startProposal';

export const { POST, ALL } = route({
  POST: endpoint(startProposal, async ({ actor, params, body }) => started(await start(actor, params.number, body))),
});
