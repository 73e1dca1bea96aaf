import type { APIRoute } from 'astro';
import { servePhoto } from '@/server/photos/serve';

/** A photo at its full size. */
export const GET: APIRoute = ({ locals, params, request }) =>
  servePhoto(locals.actor, request, params['id'] ?? '', 'full');
