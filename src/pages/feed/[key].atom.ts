import type { APIRoute } from 'astro';
import { answerFeed } from '@/server/feeds/answer';

/** What was published, for a feed reader; the key in the address says whose books. Nobody need be signed in. */
export const GET: APIRoute = ({ params, request, url, clientAddress }) =>
  answerFeed(params['key'] ?? '', request, url, clientAddress);

// Without it Astro would write the address, which is a key, into its log of methods that nobody answers.
export const ALL: APIRoute = (context) =>
  context.request.method === 'HEAD'
    ? GET(context)
    : new Response('A feed is only read.\n', {
        status: 405,
        headers: { allow: 'GET, HEAD', 'referrer-policy': 'no-referrer' },
      });
