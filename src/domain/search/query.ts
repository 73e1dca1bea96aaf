import { readQuantities, type ReadQuantity } from './quantities';
import type { Phrases } from './phrases';
import { fold, plain, saysNothing, wordRuns, wordsOf } from './words';

/** One thing asked for in words: a name the trade knows, or a plain word. */
export interface Asked {
  /** Its words, folded. */
  words: string[];
  /** Vocabulary groups it names; empty for a plain word. */
  groups: readonly number[];
  /** Groups it may be on the way to name, while it is being typed. */
  completing: readonly number[];
  /** True for the last one, where nothing follows it: the word may not be finished. */
  unfinished: boolean;
}

export interface Query {
  /** Digits of a procedure number, as in P-0142, without leading zeros; null where none was typed. */
  number: string | null;
  quantities: ReadQuantity[];
  asked: Asked[];
}

const NUMBER_ALONE = /^\s*(?:p\s*[-–]?\s*)?0*(\d{1,6})\s*$/i;
const NUMBER_INSIDE = /(?<![\p{L}\d])p[-–]?0*(\d{1,6})(?![\p{L}\d])/iu;

/** Splits words into the longest names the vocabulary knows and the plain words between. */
function askedIn(text: string, phrases: Phrases): Asked[] {
  return wordRuns(text).flatMap((run) => {
    const folded = run.map((word) => fold(word.text));
    const asked: Asked[] = [];
    let at = 0;
    while (at < run.length) {
      const [longest] = phrases.startingAt(folded, at);
      const length = longest?.length ?? 1;
      const words = folded.slice(at, at + length);
      if (longest || !saysNothing(words[0] ?? ''))
        asked.push({ words, groups: longest?.groups ?? [], completing: [], unfinished: false });
      at += length;
    }
    return asked;
  });
}

const LEAST_TO_COMPLETE = 4;

/** Looks ahead of the last word: "rocker cov" is on its way to "rocker cover", whose other names count as well. */
function finish(asked: Asked[], lastWord: string, phrases: Phrases, isWord: (word: string) => boolean): Asked[] {
  const last = asked.at(-1);
  if (!last) return asked;
  const rest = asked.slice(0, -1);
  const before = rest.at(-1);
  const open: Asked = { ...last, words: [...last.words.slice(0, -1), lastWord], unfinished: true };
  if (before && last.words.length === 1) {
    const joined = [...before.words, lastWord];
    const completing = phrases.completing(joined.join(' '));
    if (completing.length > 0) return [...rest.slice(0, -1), { ...open, words: joined, groups: [], completing }];
  }
  // A word that sheets use means itself; it is not taken for the beginning of another name.
  if (lastWord.length < LEAST_TO_COMPLETE || isWord(lastWord)) return [...rest, open];
  const completing = phrases.completing(open.words.join(' ')).filter((group) => !open.groups.includes(group));
  return [...rest, { ...open, completing }];
}

/**
 * What somebody means by what they typed.
 *
 * @param isWord whether any sheet uses the word as it stands
 */
export function readQuery(text: string, phrases: Phrases, isWord: (word: string) => boolean): Query {
  const alone = NUMBER_ALONE.exec(text);
  const inside = NUMBER_INSIDE.exec(text);
  const quantities = readQuantities(text);
  let rest = plain(text);
  if (rest.length !== text.length) rest = text;
  for (const { start, end } of quantities) rest = rest.slice(0, start) + ' '.repeat(end - start) + rest.slice(end);
  if (inside && !alone)
    rest = rest.slice(0, inside.index) + ' '.repeat(inside[0].length) + rest.slice(inside.index + inside[0].length);
  const asked = askedIn(rest, phrases);
  const lastWord = wordsOf(rest).at(-1);
  const unfinished = lastWord !== undefined && lastWord.end === rest.length;
  return {
    number: (alone ?? inside)?.[1] ?? null,
    quantities,
    asked: unfinished ? finish(asked, lastWord.text, phrases, isWord) : asked,
  };
}
