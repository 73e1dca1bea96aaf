import { SIGN_IN_PAGE } from '../accounts/authConfig';
import { returnPath } from '../accounts/returnPath';

/** Keeps the address somebody typed for the page that asks again; it is not put into a link that ends up in logs. */
export const TYPED_EMAIL_COOKIE = 'matchmark.typed';

/** The form as it was sent, read from a copy so that Auth.js still can. */
export async function sentForm(request: Request): Promise<FormData | null> {
  const type = request.headers.get('content-type') ?? '';
  if (!/^(application\/x-www-form-urlencoded|multipart\/form-data)/.test(type)) return null;
  return request
    .clone()
    .formData()
    .catch(() => null);
}

/** Auth.js sends a failed sign-in back to an empty page; this adds where the person was going and what they typed. */
export function rememberFailedSignIn(response: Response, form: FormData | null, requestUrl: URL): Response {
  const location = response.headers.get('location');
  if (!form || !location || response.status < 300 || response.status > 399) return response;
  const back = new URL(location, requestUrl);
  if (back.pathname !== SIGN_IN_PAGE || !back.searchParams.has('error')) return response;
  const wanted = form.get('callbackUrl');
  const to = returnPath(typeof wanted === 'string' ? pathOf(wanted, requestUrl) : null);
  if (to !== '/') back.searchParams.set('to', to);
  const headers = new Headers(response.headers);
  headers.set('location', back.pathname + back.search);
  const email = form.get('email');
  if (typeof email === 'string' && email.length <= 254)
    headers.append(
      'set-cookie',
      `${TYPED_EMAIL_COOKIE}=${encodeURIComponent(email)}; Path=${SIGN_IN_PAGE}; Max-Age=60; HttpOnly; SameSite=Lax`,
    );
  return new Response(null, { status: 303, headers });
}

const pathOf = (wanted: string, here: URL): string | null => {
  if (!URL.canParse(wanted, here)) return null;
  const url = new URL(wanted, here);
  return url.origin === here.origin ? url.pathname + url.search + url.hash : null;
};
