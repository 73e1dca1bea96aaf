import { takeUpFlag } from '@/domain/api/operations/flags';
import { takeUpFlag as act } from '@/server/flags/act';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(takeUpFlag, async ({ actor, params }) => ({
    body: await act(actor, params.id),
  })),
});
