import type { APIContext, MiddlewareNext } from 'astro';
import { beforeEach, describe, expect, test } from 'vitest';
import { newSession, sessionCookieName } from '@/server/accounts/session';
import { onRequest } from '@/middleware';
import { forbidden, notFound } from '@/server/refusal';
import { openTestBook } from '../setup/database';
import { addPerson } from './api/support/network';

type Locals = App.Locals;
interface Asked {
  method?: string;
  cookie?: string;
  headers?: Record<string, string>;
  body?: URLSearchParams;
  /** The page or endpoint behind. */
  page?: (request: Request) => Response | Promise<Response>;
  /** The error page that a refusal leads to. */
  errorPage?: () => Response | Promise<Response>;
  locals?: Locals;
  depth?: number;
}

beforeEach(async () => {
  await openTestBook();
});

interface Answered {
  response: Response;
  reached: boolean;
  locals: Locals;
}

async function ask(path: string, asked: Asked = {}): Promise<Answered> {
  const { method = 'GET', cookie, headers = {}, body = undefined, page, locals = {} as Locals, depth = 0 } = asked;
  const errorPage = asked.errorPage ?? (() => new Response(`told why not`));
  const url = new URL(path, 'http://book.test');
  let reached = false;
  const context = {
    url,
    locals,
    request: new Request(url, { method, headers, ...(body ? { body } : {}) }),
    clientAddress: '192.0.2.1',
    cookies: { get: (name: string) => (name === sessionCookieName(false) && cookie ? { value: cookie } : undefined) },
    redirect: (to: string, status: number) => new Response(null, { status, headers: { location: to } }),
    // As Astro does it: the middleware runs again, for the request that was asked for instead.
    rewrite: async (to: Request) => {
      const { pathname } = new URL(to.url);
      if (depth > 2) return new Response('Loop Detected', { status: 508 });
      const again = await ask(pathname, {
        method: to.method,
        headers: Object.fromEntries(to.headers),
        ...(cookie ? { cookie } : {}),
        page: errorPage,
        locals,
        depth: depth + 1,
      });
      return again.response;
    },
  } as unknown as APIContext;
  const next = (async () => {
    reached = true;
    return (await page?.(context.request)) ?? new Response('page');
  }) as MiddlewareNext;
  const response = (await onRequest(context, next)) as Response;
  return { response, reached, locals };
}

const signedIn = async () => {
  const { id } = await addPerson('Somebody', [{ in: 'common', role: 'editor' }]);
  return { id, cookie: (await newSession({ personId: id, tokenVersion: 1 })).value };
};

describe('whoever is not signed in', () => {
  test.each([
    '/',
    '/procedures/P-0142',
    '/review-desk',
    '/handbook',
    '/nothing-here',
    '/sign-in-not',
    '/sign-in/../profile',
    '/%2e/profile',
    '/apidocs',
    '//sign-in',
    '/_astro/../profile',
    '/_astro/..%2fprofile',
    '/%73ign-in',
  ])('is sent from %s to the sign-in page', async (path) => {
    const { response, reached } = await ask(path);
    expect(reached).toBe(false);
    expect(response.status).toBe(303);
    expect(response.headers.get('location')).toMatch(/^\/sign-in(\?to=%2F|$)/);
  });

  test.each(['/api/v1/me', '/api/v1/procedures', '/api/v1/nothing', '/api', '/api/openapi.json.bak'])(
    'gets a problem document from %s',
    async (path) => {
      const { response, reached } = await ask(path);
      expect(reached).toBe(false);
      expect(response.status).toBe(401);
      expect(response.headers.get('content-type')).toBe('application/problem+json');
      expect(await response.json()).toMatchObject({ status: 401, title: 'Signed out' });
    },
  );

  test.each(['/sign-in', '/sign-in/', '/api/auth/csrf', '/healthz', '/readyz', '/_astro/page.css', '/figures/a.svg'])(
    'may see %s, as nobody',
    async (path) => {
      const { reached, locals } = await ask(path);
      expect(reached).toBe(true);
      expect(locals.actor.memberships).toEqual([]);
      expect(locals.person).toBeNull();
    },
  );

  test('comes back to the page that was asked for, and never to a form that was sent', async () => {
    const asked = await ask('/procedures/P-0142?units=inch');
    expect(asked.response.headers.get('location')).toBe('/sign-in?to=%2Fprocedures%2FP-0142%3Funits%3Dinch');
    const sent = await ask('/profile', { method: 'POST' });
    expect(sent.response.headers.get('location')).toBe('/sign-in');
  });
});

describe('whoever is signed in', () => {
  test('reaches the page, which is told who asks', async () => {
    const { id, cookie } = await signedIn();
    const { reached, locals } = await ask('/review-desk', { cookie });
    expect(reached).toBe(true);
    expect(locals.actor).toEqual({ personId: id, memberships: [{ in: 'common', role: 'editor' }] });
    expect(locals.person?.name).toBe('Somebody');
  });

  test('is not believed on a call that a page of another site makes', async () => {
    const { cookie } = await signedIn();
    const from = (origin: string) => ask('/profile', { method: 'POST', cookie, headers: { origin } });
    const refused = (await from('https://other.test')).response;
    expect(refused.status).toBe(403);
    expect(await refused.text()).toBe('told why not');
    expect((await from('https://other.test')).reached).toBe(false);
    expect((await from('http://book.test')).reached).toBe(true);
  });

  test('sees an error page with its status where a page refuses', async () => {
    const { cookie } = await signedIn();
    const page = () => Promise.reject(notFound());
    const { response } = await ask('/procedures/P-9999', { cookie, page });
    expect(response.status).toBe(404);
    expect(await response.text()).toBe('told why not');
  });

  test('sees it too where the refused page had read the form that was sent', async () => {
    const { cookie } = await signedIn();
    const page = async (request: Request) => {
      await request.formData();
      throw forbidden('Not by you.');
    };
    const body = new URLSearchParams({ step: 'check' });
    const { response, locals } = await ask('/procedures/P-0142/propose', { method: 'POST', cookie, body, page });
    expect(response.status).toBe(403);
    expect(await response.text()).toBe('told why not');
    expect(locals.again).toBe('/');
  });

  test('is told in one line where the error page itself fails', async () => {
    const { cookie } = await signedIn();
    const refuse = () => Promise.reject(notFound('No such sheet.'));
    const { response } = await ask('/procedures/P-9999', { cookie, page: refuse, errorPage: refuse });
    expect(response.status).toBe(404);
    expect(await response.text()).toBe('No such sheet.\n');
  });
});

test.each(['/api/auth/verify-request', '/api/auth/webauthn-options', '/api/auth/callback/other', '/api/auth/csrf/'])(
  'sign-in has nothing at %s',
  async (path) => {
    const { response, reached } = await ask(path);
    expect(reached).toBe(false);
    expect(response.status).toBe(404);
  },
);

test('a failed sign-in comes back with where the person was going, and what they typed in a cookie, not in the address', async () => {
  const sent = (callbackUrl: string) =>
    ask('/api/auth/callback/credentials', {
      method: 'POST',
      body: new URLSearchParams({ email: 'some body@test.example', password: 'wrong', callbackUrl }),
      page: () => Response.redirect('http://book.test/sign-in?error=CredentialsSignin&code=wrong'),
    });
  const { response } = await sent('http://book.test/procedures/P-0142');
  expect(response.status).toBe(303);
  expect(response.headers.get('location')).toBe(
    '/sign-in?error=CredentialsSignin&code=wrong&to=%2Fprocedures%2FP-0142',
  );
  expect(response.headers.get('set-cookie')).toMatch(
    /^matchmark\.typed=some%20body%40test\.example; Path=\/sign-in;.*HttpOnly/,
  );
  expect((await sent('https://other.test/')).response.headers.get('location')).not.toContain('to=');
});

test('every answer forbids framing, sniffing and other sites, and is kept by this browser only', async () => {
  for (const path of ['/', '/sign-in', '/api/v1/me', '/healthz']) {
    const { response } = await ask(path);
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    expect(response.headers.get('content-security-policy')).toContain("default-src 'self'");
    expect(response.headers.get('content-security-policy')).toContain("frame-ancestors 'none'");
    expect(response.headers.get('referrer-policy')).toBe('same-origin');
    expect(response.headers.get('cache-control')).toMatch(/private|no-store/);
  }
});
