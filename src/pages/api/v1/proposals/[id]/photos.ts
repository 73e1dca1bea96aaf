import { addEvidence } from '@/domain/api/operations/photos';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { addEvidence as add } from '@/server/photos/evidence';

export const { POST, ALL } = route({
  POST: endpoint(addEvidence, async ({ actor, params, body }) => ({ body: await add(actor, params.id, body.photos) })),
});
