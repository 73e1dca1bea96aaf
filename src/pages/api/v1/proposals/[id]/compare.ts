import { compareProposal } from '@/domain/api/operations/proposals';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { compareProposal as compare } from '@/server/review/compareProposal';

export const { GET, ALL } = route({
  GET: endpoint(compareProposal, async ({ actor, params }) => {
    const { base, comparison } = await compare(actor, params.id);
    return { body: { base: base?.revision.letter ?? null, comparison } };
  }),
});
