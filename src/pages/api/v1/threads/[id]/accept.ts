import { acceptSuggestion } from '@/domain/api/operations/threads';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { acceptSuggestion as accept } from '@/server/review/threads/accept';

export const { POST, ALL } = route({
  POST: endpoint(acceptSuggestion, async ({ actor, params, version }) =>
    tagged(await accept(actor, params.id, version)),
  ),
});
