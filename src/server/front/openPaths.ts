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
const OPEN_FOLDERS = ['/api/auth/', '/_astro/', '/fonts/', '/figures/'];

// Nothing open has an escape or a dot folder in its name; whoever sends one hopes that it is read in two ways.
export const isOpen = (path: string): boolean =>
  !/%|\/\./.test(path) &&
  (OPEN_PATHS.has(path.length > 1 ? path.replace(/\/$/, '') : path) ||
    OPEN_FOLDERS.some((folder) => path.startsWith(folder)));

/** These must answer while the book cannot be opened, or without opening it. */
export const needsNoBook = (path: string): boolean =>
  path === '/healthz' || (isOpen(path) && path.startsWith('/_astro/'));

export const isApi = (path: string): boolean => path === '/api' || path.startsWith('/api/');
