import type { APIRoute } from 'astro';
import { saveProfile } from '@/server/accounts/profile';
import { returnPath } from '@/server/accounts/returnPath';
import { readForm, textOf } from '@/server/http/form';

const YEAR = 365 * 24 * 60 * 60;

/** Units from the switch on a sheet: into the profile, and into a cookie for pages before signing in. */
export const POST: APIRoute = async ({ request, locals, cookies, redirect }) => {
  const form = await readForm(request);
  const units = textOf(form, 'units');
  await saveProfile(locals.actor, { units });
  cookies.set('units', units, { path: '/', sameSite: 'lax', maxAge: YEAR });
  return redirect(returnPath(textOf(form, 'back')), 303);
};
