import type { APIRoute } from 'astro';
import { readTask } from '@/server/export/tasks';

/** The current sheet as a DITA 1.2 task, for a documentation system elsewhere. */
export const GET: APIRoute = async ({ params, locals, url }) => {
  const { name, text } = await readTask(locals.actor, params['number'] ?? '', url.origin);
  return new Response(text, {
    headers: {
      'content-type': 'application/dita+xml; charset=utf-8',
      'content-disposition': `attachment; filename="${name}"`,
    },
  });
};
