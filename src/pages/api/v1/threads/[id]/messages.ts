import { writeMessage } from '@/domain/api/operations/threads';
import { endpoint } from '@/server/http/endpoint';
import { versionTag } from '@/server/http/preconditions';
import { route } from '@/server/http/route';
import { writeMessage as act } from '@/server/review/threads/turn';

export const { POST, ALL } = route({
  POST: endpoint(writeMessage, async ({ actor, params, body }) => {
    const thread = await act(actor, params.id, body.text, body.photos);
    return { body: thread, tag: versionTag(thread.version) };
  }),
});
