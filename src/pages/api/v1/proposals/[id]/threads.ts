import { listThreads, startThread } from '@/domain/api/operations/threads';
import { endpoint } from '@/server/http/endpoint';
import { versionTag } from '@/server/http/preconditions';
import { route } from '@/server/http/route';
import { readThreads } from '@/server/review/threads/read';
import { startThread as start } from '@/server/review/threads/start';

export const { GET, POST, ALL } = route({
  GET: endpoint(listThreads, async ({ actor, params }) => ({ body: await readThreads(actor, params.id) })),
  POST: endpoint(startThread, async ({ actor, params, version, body }) => {
    const thread = await start(actor, params.id, body, version);
    return { body: thread, tag: versionTag(thread.version) };
  }),
});
