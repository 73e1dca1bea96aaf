import { createHash } from 'node:crypto';
import { decode, encode } from '@auth/core/jwt';
import { LRUCache } from 'lru-cache';
import { app } from '../context';
import type { SignedIn } from './checkSignIn';

/** Seconds a session lasts. */
export const SESSION_SECONDS = 30 * 24 * 60 * 60;

/** Over https the browser then takes the cookie from this host only, and never sends it in the clear. */
export const sessionCookieName = (secure: boolean) => `${secure ? '__Secure-' : ''}matchmark.session`;

export const sessionCookieOptions = (secure: boolean) =>
  ({ httpOnly: true, sameSite: 'lax', path: '/', secure, maxAge: SESSION_SECONDS }) as const;

/** What the token says; roles and names are not in it, they are read on each request. */
export interface SessionToken {
  sub?: string;
  version?: number;
  exp?: number;
}

interface Kept extends SignedIn {
  /** Seconds since 1970. */
  until: number;
}

// Taking the token apart costs more than all the rest of a request, so that is done once for each cookie.
const kept = new LRUCache<string, Kept>({ max: 2000 });

/** The person and version that the cookie was given for; null where there is none, or it is old or forged. */
export async function readSession(cookie: string | undefined): Promise<SignedIn | null> {
  if (!cookie) return null;
  const { secret, config } = await app();
  const key = createHash('sha256').update(secret).update(cookie).digest('base64');
  let found = kept.get(key);
  if (!found) {
    const salt = sessionCookieName(isSecure(config.origin));
    const token = await decode<SessionToken>({ token: cookie, secret, salt }).catch(() => null);
    if (!token?.sub || token.version === undefined || token.exp === undefined) return null;
    found = { personId: token.sub, tokenVersion: token.version, until: token.exp };
    kept.set(key, found);
  }
  return found.until > Date.now() / 1000 ? found : null;
}

/** A fresh session cookie, for a person who stays signed in while their other sessions end. */
export async function newSession({ personId, tokenVersion }: SignedIn) {
  const { secret, config } = await app();
  const secure = isSecure(config.origin);
  const name = sessionCookieName(secure);
  const value = await encode<SessionToken>({
    token: { sub: personId, version: tokenVersion },
    secret,
    salt: name,
    maxAge: SESSION_SECONDS,
  });
  return { name, value, options: sessionCookieOptions(secure) };
}

export const isSecure = (origin: string | null): boolean => origin?.startsWith('https:') ?? false;
