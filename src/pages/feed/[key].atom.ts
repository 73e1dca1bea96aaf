import type { APIRoute } from 'astro';
import { answerFeed } from '@/server/feeds/answer';

/** What was published, for a feed reader; the key in the address says whose books. Nobody need be signed in. */
export const GET: APIRoute = ({ params, request, url, clientAddress }) =>
  answerFeed(params['key'] ?? '', request, url, clientAddress);
