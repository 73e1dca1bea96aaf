import { searchBook } from '@/domain/api/operations/search';
import { readFilters } from '@/domain/search/filters';
import { searchBook as search } from '@/server/book/search';
import { readTrade } from '@/server/book/trade';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { GET, ALL } = route({
  GET: endpoint(searchBook, async ({ actor, query, context }) => {
    const { engines } = await readTrade();
    const { q, limit, ...chosen } = query;
    const filters = readFilters(
      new URLSearchParams(chosen),
      engines.map(({ key }) => key),
    );
    const units = context.locals.person?.units ?? 'metric';
    const { hits, ...answer } = await search(actor, q, filters, { limit, units });
    return { body: { items: hits, ...answer } };
  }),
});
