/** Nothing is loaded from, sent to or framed by another site. Astro writes its island loader inline. */
const policy = (connect: string) =>
  [
    "default-src 'self'",
    "script-src 'self' 'unsafe-inline'",
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    `connect-src ${connect}`,
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');

const HEADERS: Record<string, string> = {
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'same-origin',
  'X-Frame-Options': 'DENY',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy': 'geolocation=(), microphone=(), payment=(), usb=()',
};

/**
 * For answers that end a session. A browser keeps pages for its Back button whatever `no-cache` says; at a bench that
 * many use, the next person must not find those of the last.
 */
export const FORGET_PAGES = { 'Clear-Site-Data': '"cache"' };

/**
 * The response with the headers that every answer carries. Pages depend on who asks, so they may be kept
 * by that browser only, and asked for again each time: nobody works from an old sheet.
 * `development`: Vite's own socket is let through.
 */
export function withHeaders(response: Response, development: boolean): Response {
  const set = (headers: Headers) => {
    for (const [name, value] of Object.entries(HEADERS))
      if (name !== 'Referrer-Policy' || headers.get(name) !== 'no-referrer') headers.set(name, value);
    if (!headers.has('Content-Security-Policy'))
      headers.set('Content-Security-Policy', policy(development ? "'self' ws:" : "'self'"));
    if (!headers.has('Cache-Control')) headers.set('Cache-Control', 'private, no-cache');
  };
  try {
    set(response.headers);
    return response;
  } catch {
    // A redirect's headers cannot be changed. Wrapping every response would cost a sheet a tenth of its speed.
    const { status, statusText } = response;
    const headers = new Headers(response.headers);
    set(headers);
    return new Response(response.body, { status, statusText, headers });
  }
}
