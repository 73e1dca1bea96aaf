import { deletePhoto } from '@/domain/api/operations/photos';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { takeOffPhoto } from '@/server/photos/remove';

export const { DELETE, ALL } = route({
  DELETE: endpoint(deletePhoto, async ({ actor, params }) => {
    await takeOffPhoto(actor, params.id);
    return { body: undefined };
  }),
});
