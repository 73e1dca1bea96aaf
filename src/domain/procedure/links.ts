import type { Link } from 'mdast';

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

/**
 * The words of an address that was only written, not made a link by hand (GFM autolink literals: `www.`,
 * `http://`, e-mail), where it may not be linked to; null for every other link. Such an address stays plain text.
 */
export function plainAddress(link: Link): string | null {
  const [only, ...more] = link.children;
  if (only?.type !== 'text' || more.length || linkFault(link.url) === null) return null;
  const { start, end } = link.position ?? {};
  const written =
    start?.offset === undefined || end?.offset === undefined ? only.value.length : end.offset - start.offset;
  const isLiteral = [only.value, `mailto:${only.value}`, `http://${only.value}`].includes(link.url);
  return isLiteral && written === only.value.length ? only.value : null;
}
