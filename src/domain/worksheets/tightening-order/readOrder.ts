/** Bolt numbers out of "3 8 2 7", "3-8-2-7", "3, 8 → 2, 7"; null where something else stands between them. */
export function readOrder(text: string): number[] | null {
  if (!/^[\d\s,;>→–-]+$/.test(text)) return null;
  const found = text.match(/\d+/g);
  return found ? found.map(Number) : null;
}
