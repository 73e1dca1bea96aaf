/**
 * HTML brought to one form, so that two writings of the same meaning are equal: character references decoded, line
 * ends inside a paragraph as spaces, no space around blocks, addresses decoded, no `rel`, which only we add.
 */
export function sameForm(html: string): string {
  const named: Record<string, string> = { quot: '"', lt: '<', gt: '>', amp: '&' };
  return html
    .replace(/ rel="noopener"| scope="col"/g, '')
    .replace(/ (?:data-)?align="(\w+)"/g, ' align="$1"')
    .replace(/<br \/>/g, '<br>')
    .replace(/&(?:#x([0-9A-Fa-f]+)|(quot|lt|gt|amp));/g, (_, hex: string | undefined, name: string | undefined) =>
      hex ? String.fromCodePoint(parseInt(hex, 16)) : (named[name ?? ''] ?? ''),
    )
    .replace(/href="([^"]*)"/g, (whole, address: string) => {
      try {
        return `href="${decodeURI(address)}"`;
      } catch {
        return whole;
      }
    })
    .replace(/\s+/g, ' ')
    .replace(/ ?(<\/?(?:p|ul|ol|li|blockquote|table|thead|tbody|tr|th|td)(?: [^>]*)?>) ?/g, '$1')
    .replace(/ ?<br> ?/g, '<br>')
    .trim();
}
