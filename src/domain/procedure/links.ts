const HELP =
  'A link goes to an address that starts with https:// or to a path of this book, such as /handbook/signal-words.';

/**
 * Why `url` (already decoded) may not be linked to, as a sentence, or null. A path must start with
 * one slash; everything else must be https, without a name or password in it.
 */
export function linkFault(url: string): string | null {
  if (url === '' || /[\s\\\u0000-\u001f\u007f]/.test(url)) return `This address cannot be used. ${HELP}`;
  if (/^\/(?!\/)/.test(url)) return null;
  if (!/^https:\/\/[^/]/i.test(url)) return HELP;
  try {
    const { username, password } = new URL(url);
    return username || password ? `An address with a name or password in it cannot be used. ${HELP}` : null;
  } catch {
    return `This address is not complete. ${HELP}`;
  }
}
