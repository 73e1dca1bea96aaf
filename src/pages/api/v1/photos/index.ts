import { uploadPhoto } from '@/domain/api/operations/photos';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { uploadPhoto as keep } from '@/server/photos/upload';

export const { POST, ALL } = route({
  POST: endpoint(uploadPhoto, async ({ actor, body, file }) => {
    const photo = await keep(actor, file, body.alt);
    return { body: photo, location: photo.url };
  }),
});
