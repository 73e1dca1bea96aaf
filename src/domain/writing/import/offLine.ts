/** Raised and lowered figures by signs of their own: "10" with a raised 2 must not become 102. */

const digits = (signs: string) => Object.fromEntries(Array.from(signs, (sign, i) => [String(i), sign]));
const SIGNS: Record<'sup' | 'sub', Record<string, string>> = {
  sup: { '+': '⁺', '-': '⁻', '−': '⁻', '=': '⁼', '(': '⁽', ')': '⁾', ...digits('⁰¹²³⁴⁵⁶⁷⁸⁹') },
  sub: { '+': '₊', '-': '₋', '−': '₋', '=': '₌', '(': '₍', ')': '₎', ...digits('₀₁₂₃₄₅₆₇₈₉') },
};

/** The text raised or lowered; null where there is no such sign for one of its letters. */
export function offLine(kind: 'sup' | 'sub', text: string): string | null {
  const signs = Array.from(text.trim(), (sign) => SIGNS[kind][sign]);
  return signs.length > 0 && signs.every((sign) => sign !== undefined) ? signs.join('') : null;
}
