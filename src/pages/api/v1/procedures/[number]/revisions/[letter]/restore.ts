import { restoreRevision } from '@/domain/api/operations/history';
import { endpoint } from '@/server/http/endpoint';
import { started } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { restoreRevision as restore } from '@/server/review/restore';

export const { POST, ALL } = route({
  POST: endpoint(restoreRevision, async ({ actor, params: { number, letter }, body }) =>
    started(await restore(actor, number, letter, body.reason)),
  ),
});
