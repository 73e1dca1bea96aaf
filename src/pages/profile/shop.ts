import type { APIRoute } from 'astro';
import { setCurrentShop } from '@/server/accounts/profile';
import { readForm, textOf } from '@/server/http/form';

/** The shop a person with several works in from now on. */
export const POST: APIRoute = async ({ request, locals, redirect }) => {
  const form = await readForm(request);
  await setCurrentShop(locals.actor, textOf(form, 'shop'));
  return redirect('/', 303);
};
