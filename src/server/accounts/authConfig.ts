import type { AuthConfig } from '@auth/core';
import { AuthError, CredentialsSignin } from '@auth/core/errors';
import credentials from '@auth/core/providers/credentials';
import type { Config } from '../config';
import { Refusal } from '../refusal';
import { checkSignIn } from './checkSignIn';
import { isSecure, SESSION_SECONDS, sessionCookieName, sessionCookieOptions } from './session';

export const AUTH_PREFIX = '/api/auth';
export const SIGN_IN_PAGE = '/sign-in';

class WrongPassword extends CredentialsSignin {
  override code = 'wrong';
}
class TooManyTries extends CredentialsSignin {
  override code = 'too-many';
}

async function authorize({ email, password }: Partial<Record<'email' | 'password', unknown>>) {
  if (typeof email !== 'string' || typeof password !== 'string') throw new WrongPassword();
  try {
    const person = await checkSignIn(email, password);
    if (!person) throw new WrongPassword();
    return { id: person.personId, version: person.tokenVersion };
  } catch (error) {
    if (error instanceof Refusal && error.status === 429) throw new TooManyTries();
    throw error;
  }
}

/** E-mail and password, and a session in an encrypted cookie that holds only the person's id and token version. */
export function authConfig(config: Config, secret: string) {
  const secure = isSecure(config.origin);
  return {
    prefix: AUTH_PREFIX,
    basePath: AUTH_PREFIX,
    secret,
    // The front door (server.mjs) refuses hosts that are not ours.
    trustHost: true,
    useSecureCookies: secure,
    pages: { signIn: SIGN_IN_PAGE, error: SIGN_IN_PAGE, signOut: SIGN_IN_PAGE },
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    cookies: { sessionToken: { name: sessionCookieName(secure), options: sessionCookieOptions(secure) } },
    providers: [credentials({ credentials: { email: {}, password: {} }, authorize })],
    callbacks: {
      jwt: ({ token, user }) => (user ? { sub: user.id, version: (user as { version?: number }).version } : token),
      session: ({ session, token }) => ({ expires: session.expires, user: { id: token.sub } }),
    },
    logger: {
      error(error) {
        // A wrong password or a stale form is the reader's everyday, not a fault of the server.
        if (error instanceof AuthError && ['CredentialsSignin', 'MissingCSRF'].includes(error.type)) return;
        console.error(error);
      },
    },
  } satisfies AuthConfig & { prefix: string };
}
