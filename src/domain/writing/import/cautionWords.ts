import { fillIn } from '../../procedure/fillIn';
import type { Caution } from '../../procedure/schema';
import { capital } from '../../wording';
import { tidy } from './nodes';

/** A caution as ANSI Z535.6 wants it said: the hazard, the harm, how to avoid it. `rest` found no room in it. */
export type SaidCaution = Omit<Caution, 'key'> & { rest: string };

const MOST = { hazard: 160, harm: 160, avoid: 240 } as const;
export const HAZARD_TO_FILL_IN = fillIn('what can hurt.');
export const HARM_TO_FILL_IN = fillIn('what it does, and to whom.');
export const AVOID_TO_FILL_IN = fillIn('how to avoid it.');

/** "Hot oil can burn skin" says hazard and harm in one. */
const HAZARD_AND_HARM = /^(.{3,}?) ((?:can|may|will|could|might)\b.{3,}|(?:causes?|burns?|cuts?|crush(?:es)?) .{3,})$/i;
/** A sentence that begins so tells what to do, not what hurts. */
const TELLS_WHAT_TO_DO =
  /^(do not|don['’]t|never|always|make sure|be sure|ensure|wear|keep|let|use|disconnect|switch|turn|wait|allow|take|avoid|check|stand|stay|handle|relieve|drain|work|have|hold|support|clean|place|put|remove|read|see|if|before|when|only|no )\b/i;

/** Sentences of a text, each with its full stop. A number with a point in it does not end one. */
export const sentencesOf = (text: string): string[] =>
  tidy(text)
    .split(/(?<=[.!?]["”’)]*)\s+(?=["“‘(]?[\p{Lu}\p{N}])/u)
    .filter(Boolean);

const bare = (sentence: string) => sentence.replace(/[.\s]+$/, '');

/** As many of the sentences as `most` characters hold, and the others. */
function fitting(sentences: readonly string[], most: number): { text: string; rest: string } {
  let text = '';
  let i = 0;
  for (; i < sentences.length; i += 1) {
    const longer = text ? `${text} ${sentences[i] ?? ''}` : (sentences[i] ?? '');
    if (longer.length > most) break;
    text = longer;
  }
  return { text, rest: sentences.slice(i).join(' ') };
}

/**
 * The words behind a signal word, put into hazard, harm and how to avoid it as far as the sentences allow; what they
 * do not say is left to fill in. Nothing is lost: what does not fit stands in `rest`.
 */
export function saidCaution(signal: Caution['signal'], words: string): SaidCaution {
  const [first = '', ...others] = sentencesOf(words);
  const said = { signal, hazard: HAZARD_TO_FILL_IN, harm: HARM_TO_FILL_IN, avoid: AVOID_TO_FILL_IN };
  const withAvoid = (sentences: readonly string[]) => {
    const { text, rest } = fitting(sentences, MOST.avoid);
    return { avoid: capital(text) || AVOID_TO_FILL_IN, rest };
  };
  if (TELLS_WHAT_TO_DO.test(first)) return { ...said, ...withAvoid([first, ...others]) };
  const both = HAZARD_AND_HARM.exec(bare(first));
  const [hazard = '', harm = ''] = both ? [both[1], both[2]] : [bare(first)];
  if (!hazard || hazard.length > MOST.hazard || harm.length > MOST.harm) return { ...said, rest: tidy(words) };
  return { ...said, hazard: capital(hazard), harm: harm || HARM_TO_FILL_IN, ...withAvoid(others) };
}
