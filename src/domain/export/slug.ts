/** A name as files and addresses carry it: "Halden Værk, Ærø" gives "halden-vaerk-aero". Empty where nothing of it is left. */
export const slugOf = (name: string): string =>
  name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/\p{M}/gu, '')
    .replaceAll('ß', 'ss')
    .replaceAll('æ', 'ae')
    .replaceAll('œ', 'oe')
    .replaceAll('ø', 'o')
    .replaceAll('ł', 'l')
    .split(/[^a-z0-9]+/)
    .filter(Boolean)
    .join('-')
    .slice(0, 60)
    .replace(/-$/, '');

/** `P-0200`, "Valve cover: reseal" → `p-0200-valve-cover-reseal.mdx` */
export const fileName = (number: string, title: string): string =>
  `${number.toLowerCase()}-${slugOf(title) || 'procedure'}.mdx`;
