import { listProcedures, startProcedure } from '@/domain/api/operations/book';
import { listProcedures as list } from '@/server/book/list';
import { endpoint } from '@/server/http/endpoint';
import { started } from '@/server/http/proposalReply';
import { route } from '@/server/http/route';
import { startProcedure as start } from '@/server/review/startProcedure';

export const { GET, POST, ALL } = route({
  GET: endpoint(listProcedures, async ({ actor, query }) => ({ body: await list(actor, query) })),
  POST: endpoint(startProcedure, async ({ actor, body }) => started(await start(actor, body))),
});
