import { Auth } from '@auth/core';
import { app } from '../context';
import { AUTH_PREFIX, authConfig } from './authConfig';
import { isSecure, sessionCookieName } from './session';

/**
 * The token that a form posting to `/api/auth/callback/credentials` or `/api/auth/signout` must carry as
 * `csrfToken`, and the `Set-Cookie` lines that the page must send with it.
 */
export async function csrfFor(request: Request): Promise<{ token: string; setCookies: string[] }> {
  const { config, secret } = await app();
  const url = new URL(`${AUTH_PREFIX}/csrf`, request.url);
  const cookie = request.headers.get('cookie');
  const answer = await Auth(new Request(url, { headers: cookie ? { cookie } : {} }), authConfig(config, secret));
  const { csrfToken } = (await answer.json()) as { csrfToken: string };
  return { token: csrfToken, setCookies: answer.headers.getSetCookie() };
}

/** Why signing in failed, for the reader; null where it did not. `url` is the one of the sign-in page. */
export function signInProblem(url: URL): string | null {
  const error = url.searchParams.get('error');
  if (!error) return null;
  if (error === 'MissingCSRF') return 'This page had been open for too long. Try again.';
  if (error !== 'CredentialsSignin') return 'Signing in did not work. Try again.';
  return url.searchParams.get('code') === 'too-many'
    ? 'Too many wrong passwords. Wait a quarter of an hour, then try again.'
    : 'The e-mail address and the password do not belong together.';
}

/** Why somebody who was signed in is asked again; null for a fresh visitor. */
export async function endedNotice(url: URL, cookies: { has(name: string): boolean }): Promise<string | null> {
  const ended = url.searchParams.get('ended');
  if (ended === 'here') return 'Signed out.';
  if (ended === 'everywhere') return 'Signed out everywhere.';
  const { config } = await app();
  return cookies.has(sessionCookieName(isSecure(config.origin)))
    ? 'Your session has ended. Sign in again to go on.'
    : null;
}
