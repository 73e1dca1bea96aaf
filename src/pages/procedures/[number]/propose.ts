import type { APIRoute } from 'astro';
import { readForm } from '@/server/http/form';
import { openDraft } from '@/server/review/writing';

const back = (number: string | undefined) => `/procedures/${encodeURIComponent(number ?? '')}`;

/** The sheet's button: goes on with the draft that is open, or begins one, at the step that was pressed. */
export const POST: APIRoute = async ({ params, request, locals, redirect }) => {
  const step = (await readForm(request)).get('step');
  const id = await openDraft(locals.actor, params.number ?? '');
  const place = typeof step === 'string' && /^[a-z0-9-]{1,40}$/.test(step) ? `#step-${step}` : '';
  return redirect(`/proposals/${id}/edit${place}`, 303);
};

export const GET: APIRoute = ({ params, redirect }) => redirect(back(params.number), 303);
