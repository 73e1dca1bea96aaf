import { z } from 'zod';
import { operation } from '../operation';
import { SearchQuery, SearchReply } from '../schemas/search';

export const searchBook = operation({
  id: 'searchBook',
  method: 'get',
  path: '/search',
  area: 'Search',
  summary: 'Look up sheets of the books that I may read, best first',
  description:
    'Ranks with the same code and in the same order as the pages do, then adds sheets that hold the words only in their prose.',
  query: SearchQuery,
  reply: SearchReply,
});

export const readSearchIndex = operation({
  id: 'readSearchIndex',
  method: 'get',
  path: '/search-index',
  area: 'Search',
  summary: 'What the pages search on: names and values of every sheet that I may read, no prose',
  description: 'Made for the pages of this release; its form may change with any release. Compressed where accepted.',
  reply: z.object({ version: z.literal(1) }).passthrough(),
  tag: 'content',
});
