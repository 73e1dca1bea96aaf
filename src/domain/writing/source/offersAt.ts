import { headOffers } from './headOffers';
import { headLinesOf } from './looseHead';
import type { Known, Offers } from './offer';
import { tagOffers } from './tagOffers';

/**
 * What can stand at the caret of a sheet that is written as text; null where nothing in particular can. Goes by bare lines,
 * so it works on a text that is too faulty to be read.
 */
export function offersAt(text: string, at: number, known: Known): Offers | null {
  const line = text.slice(0, at).split('\n').length;
  const head = headLinesOf(text);
  const fences = line === 1 || (line === head && text.split('\n')[line - 1]?.startsWith('---'));
  if (head > 0 && fences) return null;
  const found = line <= head ? headOffers(text, at, known) : tagOffers(text, at);
  return found && found.offers.length > 0 ? found : null;
}
