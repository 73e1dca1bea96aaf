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

/** How freely words are read: as they stand, or with slips and other endings. */
export type Reading = 'strict' | 'loose';

/** How many letters may be wrong: none in a short word or a number, where any other would do. */
const slipsIn = (word: string): number => (word.length < 4 || /\d/.test(word) ? 0 : word.length < 7 ? 1 : 2);

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
function answerWord(postings: Postings, word: string, unfinished: boolean, reading: Reading): Answer {
  const answer = empty(postings);
  const own = postings.get(word);
  if (own) take(answer, [[word, own, 1]], 1);
  const mayGoOn = unfinished ? !/^\d{1,2}$/.test(word) : !own && word.length > 2;
  if (mayGoOn) take(answer, postings.beginning(word), 1);
  if (answer.terms.size > 0 && reading === 'strict') return answer;
  const slips = slipsIn(word);
  if (slips > 0) take(answer, postings.near(word, slips), 1);
  const stem = stemOf(word);
  if (stem) take(answer, postings.beginning(stem), OTHER_ENDING);
  // Two letters changed places count as two slips; only where nothing else was found.
  if (answer.terms.size === 0 && slips === 1 && word.length > 4) take(answer, postings.near(word, 2), 1);
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

/** Sheets that any of the answers hold; those that more of them hold stand first. */
export function either(postings: Postings, answers: readonly Answer[]): Answer {
  const any = empty(postings);
  for (let at = 0; at < postings.size; at += 1) {
    let sum = 0;
    let held = 0;
    for (const { scores } of answers) {
      const score = scores[at] as number;
      sum += score;
      if (score > 0) held += 1;
    }
    any.scores[at] = sum * held;
  }
  for (const { terms } of answers) for (const term of terms) any.terms.add(term);
  return any;
}

/** One thing asked for: by the names the trade has for it, or by its own words. */
export function answerAsked(postings: Postings, asked: Asked, reading: Reading): Answer {
  const inWords = (): Answer => {
    const last = asked.words.length - 1;
    return together(
      postings,
      asked.words.map((word, i) => answerWord(postings, word, asked.unfinished && i === last, reading)),
    );
  };
  const names = [...asked.groups, ...asked.completing];
  if (names.length === 0) return inWords();
  const answer = empty(postings);
  const weigh = asked.groups.length > 0 ? 1 : COMPLETING;
  for (const token of names.map(groupToken)) {
    const posting = postings.get(token);
    if (posting) take(answer, [[token, posting, 1]], weigh);
  }
  if (!asked.unfinished && reading === 'strict') return answer;
  const words = inWords();
  for (let at = 0; at < postings.size; at += 1)
    answer.scores[at] = Math.max(answer.scores[at] as number, OWN_WORDS * (words.scores[at] as number));
  for (const term of words.terms) answer.terms.add(term);
  return answer;
}
