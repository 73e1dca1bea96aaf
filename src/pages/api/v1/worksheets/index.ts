import { listWorksheets } from '@/domain/api/operations/worksheets';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { listWorksheets as list } from '@/server/measure/worksheets';

export const { GET, ALL } = route({
  GET: endpoint(listWorksheets, () => Promise.resolve({ body: { items: list() } })),
});
