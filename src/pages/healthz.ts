import type { APIRoute } from 'astro';

/** The process answers; says nothing of its database (see readyz). */
export const GET: APIRoute = () => new Response('ok\n', { headers: { 'content-type': 'text/plain' } });
