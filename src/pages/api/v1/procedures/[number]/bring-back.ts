import { bringBackProcedure } from '@/domain/api/operations/bulletins';
import { bringBack } from '@/server/bulletins/withdraw';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(bringBackProcedure, async ({ actor, params, body }) => ({
    body: await bringBack(actor, params.number, body.reason),
  })),
});
