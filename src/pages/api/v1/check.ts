import { checkSource } from '@/domain/api/operations/book';
import { checkSource as check } from '@/server/book/check';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(checkSource, async ({ actor, body }) => ({ body: await check(actor, body.source, body) })),
});
