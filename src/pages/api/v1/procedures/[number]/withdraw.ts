import { withdrawProcedure } from '@/domain/api/operations/bulletins';
import { withdraw } from '@/server/bulletins/withdraw';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(withdrawProcedure, async ({ actor, params, body }) => ({
    body: await withdraw(actor, params.number, body.reason),
  })),
});
