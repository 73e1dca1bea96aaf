import type { APIRoute } from 'astro';
import { isReady, readyWarnings } from '@/server/ready';

/**
 * Whether the book can be read and written now; for whoever operates the server. A line `warning:` says what needs looking
 * at although it can. Says no more than that.
 */
export const GET: APIRoute = async () => {
  const ready = await isReady();
  const warnings = ready ? await readyWarnings() : [];
  return new Response([ready ? 'ready' : 'not ready', ...warnings.map((one) => `warning: ${one}`), ''].join('\n'), {
    status: ready ? 200 : 503,
    headers: { 'content-type': 'text/plain', 'cache-control': 'no-store', ...(ready ? {} : { 'retry-after': '5' }) },
  });
};
