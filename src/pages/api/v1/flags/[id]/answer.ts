import { answerFlag } from '@/domain/api/operations/flags';
import { answerFlag as act } from '@/server/flags/act';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(answerFlag, async ({ actor, params, body }) => ({
    body: await act(actor, params.id, body.text),
  })),
});
