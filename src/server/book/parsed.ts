import { createHash } from 'node:crypto';
import { LRUCache } from 'lru-cache';
import type { Parsed } from '@/domain/procedure/types';
import { parseSafely } from './parsing';

/** SHA-256 of a text, hex: the identity of a revision. */
export const hashOf = (source: string): string => createHash('sha256').update(source, 'utf8').digest('hex');

// A parsed text is some 300 KB; comparing and reviewing ask for the same few again and again.
const cache = new LRUCache<string, Promise<Parsed>>({ max: 60 });

/** What `parseSafely` makes of a text, remembered by the hash of the text. */
export function parsedText(source: string): Promise<Parsed> {
  const hash = hashOf(source);
  const known = cache.get(hash);
  if (known) return known;
  const parsed = parseSafely(source);
  cache.set(hash, parsed);
  // Running out of time depends on the machine's mood as well as on the text; it is not remembered.
  parsed.then(
    (result) => result.ok || cache.delete(hash),
    () => cache.delete(hash),
  );
  return parsed;
}
