/** What XML 1.0 has no way to write, not even as a reference: most control characters and halves of surrogate pairs. */
const NO_CHAR = /[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu;

/** A text that an XML document may hold, by the production Char of XML 1.0 (2.2); what it may not is a replacement character. */
export const xmlText = (text: string): string => text.replace(NO_CHAR, '\uFFFD');
