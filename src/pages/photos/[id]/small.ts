import type { APIRoute } from 'astro';
import { servePhoto } from '@/server/photos/serve';

/** A photo as it stands in a thread. */
export const GET: APIRoute = ({ locals, params, request }) =>
  servePhoto(locals.actor, request, params['id'] ?? '', 'small');
