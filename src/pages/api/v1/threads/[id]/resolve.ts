import { resolveThread } from '@/domain/api/operations/threads';
import { endpoint } from '@/server/http/endpoint';
import { versionTag } from '@/server/http/preconditions';
import { route } from '@/server/http/route';
import { resolveThread as act } from '@/server/review/threads/turn';

export const { POST, ALL } = route({
  POST: endpoint(resolveThread, async ({ actor, params, version }) => {
    const thread = await act(actor, params.id, version);
    return { body: thread, tag: versionTag(thread.version) };
  }),
});
