import { restoreVersion } from '@/domain/api/operations/versions';
import { endpoint } from '@/server/http/endpoint';
import { tagged } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { restoreVersion as restore } from '@/server/review/versions/restore';

export const { POST, ALL } = route({
  POST: endpoint(restoreVersion, async ({ actor, params, version }) =>
    tagged(await restore(actor, params.id, params.n, version)),
  ),
});
