/** A version as an entity tag: 3 is `"3"`. */
export const versionTag = (version: number) => `"${version}"`;

const tags = (header: string) => header.split(',').map((tag) => tag.trim().replace(/^W\//, ''));

/**
 * The version a caller believes to be current, from `If-Match`.
 * null without the header or with `*`; -1, which no version equals, for anything but one tag of ours.
 */
export function expectedVersion(headers: Headers): number | null {
  const header = headers.get('if-match');
  if (header === null || header.trim() === '*') return null;
  const found = /^(?:W\/)?"(\d{1,9})"$/.exec(header.trim());
  return found ? Number(found[1]) : -1;
}

/** Whether the caller already holds what `tag` stands for (`If-None-Match`, compared weakly as RFC 9110 13.1.2 says). */
export function alreadyHeld(headers: Headers, tag: string): boolean {
  const header = headers.get('if-none-match');
  if (header === null) return false;
  return header.trim() === '*' || tags(header).includes(tag.replace(/^W\//, ''));
}
