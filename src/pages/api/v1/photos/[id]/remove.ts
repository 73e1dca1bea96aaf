import { removePhoto } from '@/domain/api/operations/photos';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { removePhoto as remove } from '@/server/photos/remove';

export const { POST, ALL } = route({
  POST: endpoint(removePhoto, async ({ actor, params, body }) => ({
    body: await remove(actor, params.id, body.reason),
  })),
});
