import { diffArrays } from 'diff';
import { UNITS_BY_QUANTITY } from '../measure/quantities';
import type { WordRun } from './types';

/**
 * Words of two texts compared. A value is one word with its sign, decimals and unit, so that a change from 10 N·m to
 * 12 N·m never reads as a changed digit. Lines first, then words inside the lines that differ.
 */

const UNITS = [...new Set([...Object.values(UNITS_BY_QUANTITY).flat(), 'Nm', 'lb', 'psi', '°'])]
  .sort((a, b) => b.length - a.length)
  .map((unit) => unit.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&'))
  .join('|');
/** 10, −0.5, ±1, 1 200, 1/4, 3,5; the group space is the narrow one that numbers are shown with. */
const DIGITS = String.raw`\d+(?:[.,\u202f]\d+)*(?:\/\d+)?`;
const NUMBER = `[±+−-]?${DIGITS}`;
const THREAD = String.raw`M\d+(?:\.\d+)?(?:×\d+(?:\.\d+)?)+|(?:#\d+|\d+\/\d+|\d)-\d+ UN[CF]\b`;
const VALUE = String.raw`${NUMBER}(?: to ${NUMBER})?(?: ?±${DIGITS})?(?: ?(?:${UNITS})(?![\p{L}\p{N}]))?`;
const WORD = String.raw`[\p{L}\p{N}]+(?:['’-][\p{L}\p{N}]+)*`;
const TOKENS = new RegExp(
  String.raw`(?<![\p{L}\p{N}])(?:${THREAD}|${VALUE})(?![\p{L}\p{N}])|${WORD}|\n+|[^\S\n]+|.`,
  'gsu',
);

/** A number with its unit, "0.80 to 1.40 mm"; set apart where a text is shown. */
export const MEASURED = new RegExp(
  String.raw`(?<![\p{L}\p{N}])${NUMBER}(?: to ${NUMBER})?(?: ?±${DIGITS})? ?(?:${UNITS})(?![\p{L}\p{N}])`,
  'gu',
);

/** The text cut into words, values, spaces and single marks; joined again they are the text. */
export const tokensOf = (text: string): string[] => text.match(TOKENS) ?? [];

/** Beyond this many changed words or lines in one place the texts have little in common; and never a slow reply. */
const BOUNDS = { maxEditLength: 600, timeout: 200 };
/**
 * A place where telling the kept words apart would save no more than this share of the changed ones reads better as
 * struck out and written anew. The same tenth that the comparison may be coarser than git's.
 */
const WORTH_TELLING = 0.1;

function push(runs: WordRun[], kind: WordRun['kind'], text: string): void {
  if (!text) return;
  const last = runs.at(-1);
  if (last?.kind === kind) last.text += text;
  else runs.push({ kind, text });
}

/** Tells a word or a value from a mark or a blank: what has a letter or a digit. */
const isWord = (token: string) => /[\p{L}\p{N}]/u.test(token);

/** How many letters of two texts are the same marks and blanks at their beginning. A sign belongs to its number. */
function likeStart(a: string, b: string): number {
  if (!a || !b || a.charAt(0) !== b.charAt(0)) return 0;
  const others = tokensOf(b);
  let length = 0;
  for (const [i, token] of tokensOf(a).entries()) {
    if (token !== others[i] || isWord(token)) break;
    length += token.length;
  }
  return length;
}

/** Removed before added; marks and blanks that both sides of a change begin with are no part of it. */
function settle(runs: readonly WordRun[]): WordRun[] {
  const out: WordRun[] = [];
  let removed = '';
  let added = '';
  const flush = (next = '') => {
    const like = likeStart(removed, added);
    push(out, 'same', removed.slice(0, like));
    const parts = [removed.slice(like), added.slice(like)] as const;
    const only = parts[0] || parts[1];
    // "it" to "it. Dry it" before "." ends a sentence: ". Dry it" and "Dry it." are the same words, the second reads better.
    const stop =
      !(parts[0] && parts[1]) && only.length > 1 && /^[.!?:;]/.test(only) && only.charAt(0) === next.charAt(0);
    const turned = (part: string) => (stop && part ? part.slice(1) + part.charAt(0) : part);
    push(out, 'same', stop ? only.charAt(0) : '');
    push(out, 'removed', turned(parts[0]));
    push(out, 'added', turned(parts[1]));
    removed = added = '';
    return stop ? next.slice(1) : next;
  };
  for (const run of runs) {
    if (run.kind === 'removed') removed += run.text;
    else if (run.kind === 'added') added += run.text;
    else push(out, 'same', flush(run.text));
  }
  flush();
  return out;
}

/** What is compared is the words and values; the marks and blanks ahead of each only follow it. */
interface Spaced {
  words: string[];
  /** As many as `words`. */
  leads: string[];
}

/** The text in words, with an empty one at its end. */
function spacedWords(text: string): Spaced {
  const words: string[] = [];
  const leads: string[] = [];
  let lead = '';
  for (const token of tokensOf(text)) {
    if (isWord(token)) {
      words.push(token);
      leads.push(lead);
      lead = '';
    } else lead += token;
  }
  return { words: [...words, ''], leads: [...leads, lead] };
}

/** Marks and blanks ahead of a word that both texts have. */
function changedLead(runs: WordRun[], from: string, to: string): void {
  if (from === to) return push(runs, 'same', from);
  for (const { added, removed, value } of diffArrays(tokensOf(from), tokensOf(to)))
    push(runs, added ? 'added' : removed ? 'removed' : 'same', value.join(''));
}

/** A line with the empty ones after it: those are alike everywhere, and would tie the wrong lines to one another. */
const linesOf = (text: string): string[] => text.match(/\n+|[^\n]+\n*/g) ?? [];

function changedLine(from: string, to: string): WordRun[] {
  const whole: WordRun[] = [];
  push(whole, 'removed', from);
  push(whole, 'added', to);
  if (!from || !to) return whole;
  const before = spacedWords(from);
  const after = spacedWords(to);
  const parts = diffArrays(before.words, after.words, BOUNDS);
  if (!parts) return whole;
  const kept = parts.reduce((sum, part) => (part.added || part.removed ? sum : sum + part.value.length), 0) - 1;
  const changed = before.words.length + after.words.length - 2 - 2 * kept;
  if (changed > 0 && 2 * kept <= WORTH_TELLING * changed) return whole;
  const runs: WordRun[] = [];
  let [i, j] = [0, 0];
  for (const { added, removed, value } of parts)
    for (const word of value) {
      const old = added ? '' : (before.leads[i++] ?? '');
      const now = removed ? '' : (after.leads[j++] ?? '');
      if (added) push(runs, 'added', now + word);
      else if (removed) push(runs, 'removed', old + word);
      else {
        changedLead(runs, old, now);
        push(runs, 'same', word);
      }
    }
  return runs;
}

/** How many words of two lines are the same ones, wherever they stand, as a share of the longer line. */
function wordsShared(a: string, b: string): number {
  const words = tokensOf(a).filter(isWord);
  const others = tokensOf(b).filter(isWord);
  const left = new Map<string, number>();
  for (const word of words) left.set(word, (left.get(word) ?? 0) + 1);
  let shared = 0;
  for (const word of others) {
    const more = left.get(word) ?? 0;
    if (more > 0) shared += 1;
    left.set(word, more - 1);
  }
  const longer = Math.max(words.length, others.length);
  return longer === 0 ? 1 : shared / longer;
}

/** Two lines that share less than this may not be the same paragraph. */
const SAME_PARAGRAPH = 0.6;

/**
 * A line of canonical text is a paragraph: as many for as many, each alike, are taken one by one, which is the faster
 * way. Otherwise one may have come and another gone, and the words of all of them are set against each other.
 */
function changedPlace(from: string, to: string): WordRun[] {
  const before = linesOf(from);
  const after = linesOf(to);
  const oneByOne =
    before.length === after.length && before.every((line, i) => wordsShared(line, after[i] ?? '') >= SAME_PARAGRAPH);
  return oneByOne ? before.flatMap((line, i) => changedLine(line, after[i] ?? '')) : changedLine(from, to);
}

/**
 * What was kept, removed and added, in reading order. `same` and `removed` joined are `from`, `same` and `added`
 * joined are `to`. Equal texts are one `same` run; empty texts none.
 */
export function compareWords(from: string, to: string): WordRun[] {
  if (from === to) return from ? [{ kind: 'same', text: from }] : [];
  const runs: WordRun[] = [];
  let removed = '';
  let added = '';
  const flush = () => {
    runs.push(...changedPlace(removed, added));
    removed = added = '';
  };
  for (const part of diffArrays(linesOf(from), linesOf(to), BOUNDS) ?? [
    { removed: true, added: false, value: [from] },
    { removed: false, added: true, value: [to] },
  ]) {
    const text = part.value.join('');
    if (part.removed) removed += text;
    else if (part.added) added += text;
    else {
      flush();
      runs.push({ kind: 'same', text });
    }
  }
  flush();
  return settle(runs);
}
