/**
 * Where to go after signing in: a path of this site, or `/` for anything else, so that a link cannot send
 * somebody on to another one. Browsers read `\` as `/` and drop tabs and line ends, so both are refused.
 */
export function returnPath(wanted: string | null | undefined): string {
  if (!wanted?.startsWith('/') || /^\/[/\\]|[\\\p{Cc}]/u.test(wanted)) return '/';
  if (!URL.canParse(wanted, 'http://site.invalid')) return '/';
  const url = new URL(wanted, 'http://site.invalid');
  const path = url.pathname + url.search + url.hash;
  // Going back to the sign-in page after signing in would look like a failure.
  if (url.origin !== 'http://site.invalid' || /^\/(sign-in|api)(\/|$)/.test(url.pathname)) return '/';
  return path.startsWith('//') ? '/' : path;
}
