/** What look-up keeps on this machine for a person: the sheets they opened last, and the index for when there is no network. */

const RECENT = 'matchmark:recent:';
export const INDEX_CACHE = 'matchmark-search';
const MOST_RECENT = 6;

export interface RecentSheet {
  number: string;
  title: string;
}

/** What is kept, as text; empty where storage is closed to us. */
export function readRecent(person: string): string {
  try {
    return localStorage.getItem(RECENT + person) ?? '';
  } catch {
    return '';
  }
}

/** The sheets in it, the last opened first; none where it is not what this release writes. */
export function recentFrom(kept: string): RecentSheet[] {
  try {
    const list: unknown = JSON.parse(kept || '[]');
    if (!Array.isArray(list)) return [];
    return list
      .filter(
        (one): one is RecentSheet =>
          typeof one === 'object' && one !== null && typeof one.number === 'string' && typeof one.title === 'string',
      )
      .slice(0, MOST_RECENT);
  } catch {
    return [];
  }
}

export function keepRecent(person: string, sheet: RecentSheet): void {
  try {
    const { number, title } = sheet;
    const others = recentFrom(readRecent(person)).filter((other) => other.number !== number);
    localStorage.setItem(RECENT + person, JSON.stringify([{ number, title }, ...others].slice(0, MOST_RECENT)));
  } catch {
    // Nothing is lost but a convenience.
  }
}

/** Called on signing out: the next person at this machine finds nothing of the last. */
export function forgetAll(): void {
  try {
    for (const key of Object.keys(localStorage)) if (key.startsWith(RECENT)) localStorage.removeItem(key);
  } catch {
    // Closed storage holds nothing.
  }
  if ('caches' in globalThis) void caches.delete(INDEX_CACHE);
}
