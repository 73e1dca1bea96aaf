import { mergeProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { mergeProposal as merged } from '@/server/review/mergeProposal';

export const { GET, ALL } = route({
  GET: endpoint(mergeProposal, async ({ actor, params }) => ({ body: await merged(actor, params.id) })),
});
