const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Whether a request that changes something comes from our own pages, or from a program that is no browser.
 *
 * Astro's own check refuses every POST without a body or with a form's content type that carries no
 * `Origin`, which shuts out plain API clients; it is switched off and this one asked for every route.
 * A browser always sends `Origin` with a changing request or says by `Sec-Fetch-Site` where it came from;
 * a request with neither was not made by a page of somebody else's.
 *
 * @param ours the origins that count as our own: the request's own and `APP_ORIGIN`
 */
export function comesFromUs(request: Request, ours: readonly string[]): boolean {
  if (SAFE.has(request.method)) return true;
  const origin = request.headers.get('origin');
  if (origin !== null) return ours.includes(origin);
  const site = request.headers.get('sec-fetch-site');
  return site === null || site === 'same-origin';
}
