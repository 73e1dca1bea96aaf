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
/** A place that keeps less than this share of its letters reads better as struck out and written anew. */
const WORTH_KEEPING = 0.25;

function push(runs: WordRun[], kind: WordRun['kind'], text: string): void {
  if (!text) return;
  const last = runs.at(-1);
  if (last?.kind === kind) last.text += text;
  else runs.push({ kind, text });
}

/** Removed before added, and nothing but blanks kept between two changes: "a b" to "c d" is one change, not two. */
function settle(runs: readonly WordRun[]): WordRun[] {
  const out: WordRun[] = [];
  let removed = '';
  let added = '';
  const flush = () => {
    push(out, 'removed', removed);
    push(out, 'added', added);
    removed = added = '';
  };
  runs.forEach((run, i) => {
    if (run.kind === 'removed') removed += run.text;
    else if (run.kind === 'added') added += run.text;
    else if (/^[^\S\n]+$/.test(run.text) && removed && added && i < runs.length - 1) {
      removed += run.text;
      added += run.text;
    } else {
      flush();
      push(out, 'same', run.text);
    }
  });
  flush();
  return out;
}

const linesOf = (text: string): string[] => text.match(/[^\n]*\n|[^\n]+/g) ?? [];

function changedLine(from: string, to: string): WordRun[] {
  const whole: WordRun[] = [];
  push(whole, 'removed', from);
  push(whole, 'added', to);
  if (!from || !to) return whole;
  const parts = diffArrays(tokensOf(from), tokensOf(to), BOUNDS);
  if (!parts) return whole;
  const letters = (text: string) => text.replace(/\P{L}+/gu, '').length;
  const kept = parts.reduce((sum, p) => (p.added || p.removed ? sum : sum + letters(p.value.join(''))), 0);
  const all = Math.max(letters(from), letters(to));
  if (all > 0 && kept < WORTH_KEEPING * all) return whole;
  return parts.map((p): WordRun => ({
    kind: p.added ? 'added' : p.removed ? 'removed' : 'same',
    text: p.value.join(''),
  }));
}

/** A line of canonical text is a paragraph: as many for as many are taken one by one, which is also the faster way. */
function changedPlace(from: string, to: string): WordRun[] {
  const before = linesOf(from);
  const after = linesOf(to);
  if (before.length !== after.length) return changedLine(from, to);
  return before.flatMap((line, i) => changedLine(line, after[i] ?? ''));
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
