import type { APIRoute } from 'astro';
import { setCurrentShop } from '@/server/accounts/profile';
import { readForm } from '@/server/http/form';

/** The shop a person with several works in from now on. */
export const POST: APIRoute = async ({ request, locals, redirect }) => {
  const form = await readForm(request);
  await setCurrentShop(locals.actor, String(form.get('shop') ?? ''));
  return redirect('/', 303);
};
