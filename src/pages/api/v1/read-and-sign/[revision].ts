import { readAndSign } from '@/domain/api/operations/bulletins';
import * as bulletins from '@/server/bulletins/sign';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(readAndSign, async ({ actor, params }) => ({
    body: await bulletins.readAndSign(actor, params.revision),
  })),
});
