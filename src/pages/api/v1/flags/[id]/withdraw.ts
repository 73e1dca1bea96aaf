import { withdrawFlag } from '@/domain/api/operations/flags';
import { withdrawFlag as act } from '@/server/flags/act';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(withdrawFlag, async ({ actor, params }) => ({
    body: await act(actor, params.id),
  })),
});
