import type { APIRoute } from 'astro';
import { letterByCheck } from '@/server/book/permanent';

/** A sheet by the check that is printed on it: leads on to its letter. A fragment, `#step-wipe`, goes along in the browser. */
export const GET: APIRoute = async ({ params: { number = '', check = '' }, locals, redirect }) =>
  redirect(`/procedures/${number}/revisions/${await letterByCheck(locals.actor, number, check)}`, 302);
