import { discardDraft, readProposal, saveProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { discardDraft as discard } from '@/server/review/discardDraft';
import { readProposal as read } from '@/server/review/readProposal';
import { saveProposal as save } from '@/server/review/saveProposal';

export const { GET, PUT, DELETE, ALL } = route({
  GET: endpoint(readProposal, async ({ actor, params }) => tagged(await read(actor, params.id))),
  PUT: endpoint(saveProposal, async ({ actor, params, version, body }) =>
    tagged(await save(actor, params.id, version, body)),
  ),
  DELETE: endpoint(discardDraft, async ({ actor, params, version }) => {
    await discard(actor, params.id, version);
    return { body: undefined };
  }),
});
