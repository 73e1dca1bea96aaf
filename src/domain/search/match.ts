import type { Postings } from './postings';
import type { Asked } from './query';
import { groupToken } from './tokens';
import { stemOf } from './words';

/** What of the index answers one thing that was asked for. */
export interface Answer {
  /** Score of each sheet, 0 where it does not answer. */
  scores: Float32Array;
  /** Tokens of the index that were taken for it. */
  terms: Set<string>;
}

/**
 * How freely words are read: only as they stand and as a beginning; with slips and other endings where the index does
 * not have the word; or with those in any case.
 */
type WordReading = 'exact' | 'strict' | 'loose';
export type Reading = Exclude<WordReading, 'exact'>;

/** How many letters may be wrong: none in a short word or a number, where any other would do. */
const slipsIn = (word: string): number => (word.length < 4 || /\d/.test(word) ? 0 : word.length < 7 ? 1 : 2);

/** The word with each two neighbouring letters changed over: the commonest slip, which counts as two elsewhere. */
const swaps = (word: string): string[] =>
  word.length < 4
    ? []
    : Array.from(
        { length: word.length - 1 },
        (_, i) => word.slice(0, i) + word.charAt(i + 1) + word.charAt(i) + word.slice(i + 2),
      );

const SWAPPED = 0.6;
const OWN_WORDS = 0.5;
const COMPLETING = 0.8;
const OTHER_ENDING = 0.6;

function take(
  answer: Answer,
  found: Iterable<[string, { documents: Uint32Array; weights: Float32Array }, number]>,
  by: number,
) {
  const { scores } = answer;
  for (const [term, { documents, weights }, weight] of found) {
    answer.terms.add(term);
    const scale = weight * by;
    for (let i = 0; i < documents.length; i += 1) {
      const at = documents[i] as number;
      const score = scale * (weights[i] as number);
      if (score > (scores[at] as number)) scores[at] = score;
    }
  }
}

const empty = (postings: Postings): Answer => ({ scores: new Float32Array(postings.size), terms: new Set() });

/** One word: itself where the index has it, else words that begin so, else close ones and ones with another ending. */
function answerWord(postings: Postings, word: string, unfinished: boolean, reading: WordReading): Answer {
  const answer = empty(postings);
  const own = postings.get(word);
  if (own) take(answer, [[word, own, 1]], 1);
  const mayGoOn = unfinished ? !/^\d{1,2}$/.test(word) : !own && word.length > 2;
  if (mayGoOn) take(answer, postings.beginning(word), 1);
  if (reading === 'exact' || (answer.terms.size > 0 && reading === 'strict')) return answer;
  for (const swapped of swaps(word)) {
    const posting = postings.get(swapped);
    if (posting) take(answer, [[swapped, posting, SWAPPED]], 1);
  }
  if (answer.terms.size > 0 && reading === 'strict') return answer;
  const slips = slipsIn(word);
  if (slips > 0) take(answer, postings.near(word, slips), 1);
  const stem = stemOf(word);
  if (stem) take(answer, postings.beginning(stem), OTHER_ENDING);
  return answer;
}

/** Sheets that all of the answers hold, their scores added. */
export function together(postings: Postings, answers: readonly Answer[]): Answer {
  const [first, ...others] = answers;
  if (first && others.length === 0) return first;
  const all = empty(postings);
  for (let at = 0; at < postings.size; at += 1) {
    let sum = 0;
    for (const { scores } of answers) {
      const score = scores[at] as number;
      if (score === 0) {
        sum = 0;
        break;
      }
      sum += score;
    }
    all.scores[at] = sum;
  }
  for (const { terms } of answers) for (const term of terms) all.terms.add(term);
  return all;
}

/** Sheets that at least half of the answers hold; those that more of them hold stand first. */
export function mostly(postings: Postings, answers: readonly Answer[]): Answer {
  const any = empty(postings);
  for (let at = 0; at < postings.size; at += 1) {
    let sum = 0;
    let held = 0;
    for (const { scores } of answers) {
      const score = scores[at] as number;
      sum += score;
      if (score > 0) held += 1;
    }
    any.scores[at] = 2 * held < answers.length ? 0 : sum * held;
  }
  for (const { terms } of answers) for (const term of terms) any.terms.add(term);
  return any;
}

/** One thing asked for: by the names the trade has for it, or by its own words. */
export function answerAsked(postings: Postings, asked: Asked, reading: Reading): Answer {
  const inWords = (how: WordReading): Answer => {
    const last = asked.words.length - 1;
    return together(
      postings,
      asked.words.map((word, i) => answerWord(postings, word, asked.unfinished && i === last, how)),
    );
  };
  const names = [...asked.groups, ...asked.completing];
  if (names.length === 0) return inWords(reading);
  const answer = empty(postings);
  const takeGroup = (group: number, by: number): void => {
    const posting = postings.get(groupToken(group));
    if (posting) take(answer, [[groupToken(group), posting, 1]], by);
  };
  for (const group of asked.groups) takeGroup(group, 1);
  for (const group of asked.completing) takeGroup(group, COMPLETING);
  // A whole name of several words means that thing and not its words apart, unless nothing goes by it.
  const whole = asked.groups.length > 0 && asked.words.length > 1;
  if (reading === 'strict' && (whole || !asked.unfinished)) return answer;
  const words = inWords(asked.groups.length > 0 ? 'exact' : reading);
  for (let at = 0; at < postings.size; at += 1)
    answer.scores[at] = Math.max(answer.scores[at] as number, OWN_WORDS * (words.scores[at] as number));
  for (const term of words.terms) answer.terms.add(term);
  return answer;
}
