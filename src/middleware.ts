import type { APIContext } from 'astro';
import { defineMiddleware, sequence } from 'astro:middleware';
import { isSecure, readSession, sessionCookieName } from '@/server/accounts/session';
import { fromAddress } from '@/server/accounts/tries';
import { NOBODY, whoIs } from '@/server/accounts/whoIs';
import { rememberFailedSignIn, sentForm } from '@/server/front/failedSignIn';
import { withHeaders } from '@/server/front/headers';
import { isApi, isNoSignIn, isOpen, needsNoBook } from '@/server/front/openPaths';
import { keptSheet } from '@/server/front/sheetCache';
import { problemResponse } from '@/server/http/problem';
import { comesFromUs } from '@/server/http/origin';
import { asRefusal, forbidden, notFound, type Refusal, signedOut } from '@/server/refusal';
import { startOnce } from '@/server/start';

const headers = defineMiddleware(async (_context, next) => withHeaders(await next(), import.meta.env.DEV));

/**
 * The page that tells a reader why not, asked for anew with GET: the body of the request may be read already, and what
 * is wrong with the request must not be found wrong with its error page.
 */
async function errorPage({ locals, request, url, rewrite }: APIContext, refusal: Refusal): Promise<Response> {
  if (locals.refusal) return new Response(`${refusal.detail}\n`, { status: refusal.status });
  locals.refusal = refusal;
  locals.again = request.method === 'GET' ? url.pathname + url.search : '/';
  const cookie = request.headers.get('cookie');
  const asked = new URL(`/${[403, 404].includes(refusal.status) ? refusal.status : 500}`, url);
  const page = await rewrite(new Request(asked, { headers: cookie ? { cookie } : {} }));
  const { status } = refusal;
  return new Response(page.body, { status, headers: { ...refusal.headers, ...Object.fromEntries(page.headers) } });
}

/** Turns a thrown refusal into a problem document for the API and into an error page for a reader. */
const refusals = defineMiddleware(async (context, next) => {
  try {
    return await next();
  } catch (error) {
    const refusal = asRefusal(error);
    if (refusal.status >= 500) console.error(refusal.cause);
    if (isApi(context.url.pathname)) return problemResponse(refusal, crypto.randomUUID());
    return errorPage(context, refusal);
  }
});

/** Finds out who asks, and turns away whoever must sign in first: every path that is not named open. */
const guard = defineMiddleware(async (context, next) => {
  const { locals, url, cookies } = context;
  locals.actor ??= NOBODY;
  locals.person ??= null;
  // An error page is shown to whoever was refused with what is known already; the book may be what failed.
  if (locals.refusal || needsNoBook(url.pathname)) return next();
  if (isNoSignIn(url.pathname)) throw notFound();
  const { config } = await startOnce();
  if (!comesFromUs(context.request, [url.origin, ...(config.origin ? [config.origin] : [])]))
    throw forbidden('This was asked for by a page of another site.');
  const session = await readSession(cookies.get(sessionCookieName(isSecure(config.origin)))?.value);
  const who = session && (await whoIs(session));
  if (who) Object.assign(locals, { actor: who.actor, person: who.me });
  if (who || isOpen(url.pathname)) return next();
  if (isApi(url.pathname)) throw signedOut();
  const to = context.request.method === 'GET' ? url.pathname + url.search : '/';
  return context.redirect(to === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(to)}`, 303);
});

const signIn = defineMiddleware(async ({ request, url, clientAddress }, next) => {
  if (request.method !== 'POST' || !url.pathname.startsWith('/api/auth/callback/')) return next();
  const form = await sentForm(request);
  return rememberFailedSignIn(await fromAddress(clientAddress, () => next()), form, url);
});

/** Sheets are read far more often than anything else: sends them as they were made, while nothing about them changed. */
const sheets = defineMiddleware(async ({ request, url, locals }, next) =>
  locals.person ? ((await keptSheet(request, url, locals.actor, locals.person, () => next())) ?? next()) : next(),
);

export const onRequest = sequence(headers, refusals, guard, signIn, sheets);
