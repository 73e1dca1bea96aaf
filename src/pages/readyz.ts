import type { APIRoute } from 'astro';
import { isReady } from '@/server/ready';

/** Whether the book can be read and written now; for whoever operates the server. Says no more than that. */
export const GET: APIRoute = async () => {
  const ready = await isReady();
  return new Response(ready ? 'ready\n' : 'not ready\n', {
    status: ready ? 200 : 503,
    headers: { 'content-type': 'text/plain', 'cache-control': 'no-store', ...(ready ? {} : { 'retry-after': '5' }) },
  });
};
