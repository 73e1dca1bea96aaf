import type { APIRoute } from 'astro';
import { isSecure, sessionCookieName } from '@/server/accounts/session';
import { app } from '@/server/context';

/** Ends the session of this browser. A session is its cookie, so nothing else is kept of it. */
export const POST: APIRoute = async ({ cookies, redirect }) => {
  const { config } = await app();
  cookies.delete(sessionCookieName(isSecure(config.origin)), { path: '/', secure: isSecure(config.origin) });
  return redirect('/sign-in?ended=here', 303);
};
