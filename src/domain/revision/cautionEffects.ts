import { type Caution, SIGNAL_WORDS } from '../procedure/schema';
import { effect, type Effect } from './effect';
import { compareWords, MEASURED, tokensOf } from './words';

/** Words that make an instruction binding. To lose one of them softens it, whatever else is said. */
const BINDING = new Set(['must', 'never', 'not', 'no', 'always', 'only', 'cannot']);

const wordsOf = (text: string) =>
  tokensOf(text)
    .filter((token) => /[\p{L}\p{N}]/u.test(token))
    .map((token) => token.toLowerCase());
const measures = (text: string) => text.match(MEASURED)?.length ?? 0;

/** Why a text says less than before, in words; null where that cannot be told from its words alone. */
function saysLess(from: string, to: string): string | null {
  const [old, now] = [wordsOf(from), wordsOf(to)];
  const binding = (words: readonly string[]) => words.filter((word) => BINDING.has(word));
  const lost = binding(old).find((word) => !now.includes(word));
  if (lost !== undefined && binding(now).length < binding(old).length) return `no longer says “${lost}”`;
  if (measures(to) < measures(from)) return 'a number is taken out';
  const runs = compareWords(from, to);
  const has = (kind: 'removed' | 'added') => runs.some((run) => run.kind === kind && wordsOf(run.text).length > 0);
  if (has('removed') && !has('added')) return 'words are taken out';
  return now.length * 2 <= old.length ? `${old.length} words become ${now.length}` : null;
}

const saysMore = (from: string, to: string): boolean => {
  const runs = compareWords(from, to);
  const words = (kind: 'removed' | 'added') =>
    runs.reduce((sum, run) => sum + (run.kind === kind ? wordsOf(run.text).length : 0), 0);
  return words('added') > 0 && words('removed') === 0;
};

/**
 * What a changed field of a caution does. A weaker one is grave: a lower signal word, a binding word, a number or other
 * words taken out, or half of them gone. What is merely put otherwise is for the reviewer to read.
 */
export function cautionEffect(field: string, from: Caution, to: Caution): Effect | null {
  const weaker = (words: string) =>
    effect('caution-weaker', `Weaker: ${words}`, `the caution “${to.hazard}” is weaker`);
  if (field === 'signal') {
    const [old, now] = [SIGNAL_WORDS.indexOf(from.signal), SIGNAL_WORDS.indexOf(to.signal)];
    if (now < old) return effect('caution-stronger', `Stronger: ${to.signal}, where it was ${from.signal}`);
    return weaker(to.signal === 'NOTICE' ? 'no longer says that anybody can be hurt' : 'a lower signal word');
  }
  if (field !== 'hazard' && field !== 'harm' && field !== 'avoid') return null;
  const less = saysLess(from[field], to[field]);
  if (less !== null) return weaker(less);
  return saysMore(from[field], to[field])
    ? effect('caution-stronger', 'Says more than before')
    : effect('caution-reworded', 'Put in other words');
}
