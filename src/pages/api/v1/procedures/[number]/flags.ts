import { raiseFlag } from '@/domain/api/operations/flags';
import { raiseFlag as raise } from '@/server/flags/raise';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(raiseFlag, async ({ actor, params, body: { step, kind, text, photos } }) => ({
    body: await raise(actor, params.number, { step: step ?? null, kind, text, photos }),
  })),
});
