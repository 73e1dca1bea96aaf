/** Everything else is for people who are signed in. */
const OPEN_PATHS = new Set([
  '/sign-in',
  '/healthz',
  '/readyz',
  '/robots.txt',
  '/favicon.ico',
  '/favicon.svg',
  '/apple-touch-icon.png',
  '/site.webmanifest',
  '/api/openapi.json',
]);
// A feed is opened by the key in its address.
const OPEN_FOLDERS = ['/_astro/', '/fonts/', '/figures/', '/feed/'];

/** What of Auth.js we use; it has pages of its own too, which are none of ours. */
const SIGN_IN_PATHS = new Set(
  ['csrf', 'session', 'providers', 'signin', 'signout', 'error', 'callback/credentials'].map(
    (name) => `/api/auth/${name}`,
  ),
);

// Nothing open has an escape or a dot folder in its name; whoever sends one hopes that it is read in two ways.
export const isOpen = (path: string): boolean =>
  !/%|\/\./.test(path) &&
  (OPEN_PATHS.has(path.length > 1 ? path.replace(/\/$/, '') : path) ||
    SIGN_IN_PATHS.has(path) ||
    OPEN_FOLDERS.some((folder) => path.startsWith(folder)));

/** These must answer while the book cannot be opened, or without opening it. */
export const needsNoBook = (path: string): boolean =>
  path === '/healthz' || (isOpen(path) && path.startsWith('/_astro/'));

/** An address under sign-in's own that is none. */
export const isNoSignIn = (path: string): boolean => path.startsWith('/api/auth/') && !SIGN_IN_PATHS.has(path);

export const isApi = (path: string): boolean => path === '/api' || path.startsWith('/api/');
