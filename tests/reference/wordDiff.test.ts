import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { afterAll, describe, expect, it } from 'vitest';
import { compareWords, tokensOf } from '@/domain/revision/words';
import type { WordRun } from '@/domain/revision/types';

/**
 * Words compared, held against `git diff --word-diff=porcelain` as the installed git computes it (mark C: computed
 * here by an independent program). Git is told by a regular expression, written apart from ours, that a number, its
 * sign, its decimals and its unit are one word.
 */

// Signs and units of more than one byte stand as whole words of the pattern, so it reads alike in every locale.
const NUMBER = String.raw`(±|−|\+)?[0-9]+([.,][0-9]+)?`;
const UNIT = String.raw`(N·m|lbf·ft|lbf·in|mm|µm|kPa|bar|cc/min|kN|min|in|°C|°F|°|%)`;
const WORD_REGEX = `${NUMBER}( to ${NUMBER})?( ±[0-9]+([.,][0-9]+)?)?( ${UNIT}|°)|[A-Za-z]+(-[A-Za-z]+)*|[0-9]+|[.,;:()]`;

const folder = mkdtempSync(join(tmpdir(), 'words-'));
afterAll(() => {
  rmSync(folder, { recursive: true });
});

type Told = Pick<WordRun, 'kind' | 'text'>;

function git(from: string, to: string): Told[] {
  writeFileSync(join(folder, 'a'), `${from}\n`);
  writeFileSync(join(folder, 'b'), `${to}\n`);
  const ask = ['diff', '--no-index', '--minimal', '-U999', '--word-diff=porcelain', `--word-diff-regex=${WORD_REGEX}`];
  let out: string;
  try {
    // It answers 1 where the files differ, which is no fault.
    return [{ kind: 'same', text: execFileSync('git', [...ask, 'a', 'b'], { cwd: folder, encoding: 'utf8' }) }];
  } catch (thrown) {
    const { status, stdout } = thrown as { status: number; stdout: string };
    if (status !== 1) throw thrown;
    out = stdout;
  }
  const KINDS = { ' ': 'same', '-': 'removed', '+': 'added' } as const;
  return out
    .slice(out.indexOf('@@'))
    .split('\n')
    .slice(1)
    .flatMap((line): Told[] => {
      const kind = KINDS[line.charAt(0) as ' '] as Told['kind'] | undefined;
      return kind ? [{ kind, text: line.slice(1) }] : [];
    });
}

const isWord = (token: string) => /[\p{L}\p{N}]/u.test(token);
/** Words and values that were struck out or are new. */
const changedWords = (runs: readonly Told[]) =>
  runs.flatMap(({ kind, text }) => (kind === 'same' ? [] : tokensOf(text).filter(isWord))).length;
/** What was taken out and what put in, word by word; blanks are nobody's. */
const told = (runs: readonly Told[]) =>
  runs
    .filter(({ kind }) => kind !== 'same')
    .map(({ kind, text }) => [kind, tokensOf(text).filter((token) => token.trim())] as const)
    .filter(([, tokens]) => tokens.length > 0);

const VALUES = [
  '10 N·m', '12 N·m', '10 ±1 N·m', '89 lbf·in', '7.4 lbf·ft', '0.05 mm', '0.50 mm', '±0.5 mm', '−0.10 mm', '0.8 to 1.4 mm',
  '50 °C', '50 °F', '122 °F', '90°', '20 %', '620 cc/min', '8 µm', '8 mm', '10 min', '120 kPa', '1.2 bar', '8.3 kN',
]; // prettier-ignore
const PLAIN = [
  'lay', 'the', 'new', 'seal', 'dry', 'on', 'a', 'clean', 'face', 'and', 'press', 'it', 'home', 'bolt', 'cover', 'skin-over',
  'wait', 'wipe', 'off', 'oil', 'look', 'along', 'edge', 'tighten', 'check', 'feeler', 'gauge', 'cold', 'engine', 'twice',
]; // prettier-ignore

const word = fc.oneof(
  { weight: 3, arbitrary: fc.constantFrom(...PLAIN) },
  { weight: 1, arbitrary: fc.constantFrom(...VALUES) },
);
const sentence = fc.array(word, { minLength: 8, maxLength: 22 });
const edit = fc.record({
  what: fc.constantFrom('replace' as const, 'insert' as const, 'remove' as const),
  at: fc.nat(1000),
  word,
});
type Edit = { what: 'replace' | 'insert' | 'remove'; at: number; word: string };
const edited = (words: readonly string[], edits: readonly Edit[]) =>
  edits.reduce((list, { what, at, word: other }) => {
    const place = at % list.length;
    return list.toSpliced(place, what === 'insert' ? 0 : 1, ...(what === 'remove' ? [] : [other]));
  }, words as string[]);
const line = (words: readonly string[]) =>
  `${words.map((one, i) => (i % 7 === 6 && i < words.length - 1 ? `${one},` : one)).join(' ')}.`;

const sample = <T>(arbitrary: fc.Arbitrary<T>, numRuns: number) => fc.sample(arbitrary, { numRuns, seed: 142 });

/** Neither of them stands beside its like, so that there is one way only to tell the change. */
const plainly = (words: readonly string[], { at, word: other }: Edit) => {
  const place = at % words.length;
  return ![words[place - 1], words[place], words[place + 1]].includes(other) && words[place] !== words[place + 1];
};

describe('words compared, held against git', () => {
  it('one word or value replaced, put in or taken out: the same in 60 pairs', () => {
    const pairs = sample(fc.tuple(fc.uniqueArray(word, { minLength: 8, maxLength: 20 }), edit), 90)
      .filter(([words, one]) => plainly(words, one) && !words.includes(one.word))
      .slice(0, 60);
    expect(pairs.length).toBe(60);
    for (const [words, one] of pairs) {
      const [from, to] = [words.join(' '), edited(words, [one]).join(' ')];
      expect(told(compareWords(from, to)), `${from}\n${to}`).toEqual(told(git(from, to)));
      expect(changedWords(git(from, to))).toBe(one.what === 'replace' ? 2 : 1);
    }
  });

  const many = [
    ...sample(fc.tuple(sentence, fc.array(edit, { minLength: 1, maxLength: 8 })), 120).map(([words, edits]) => [
      line(words),
      line(edited(words, edits)),
    ]),
    // Two sentences that have only chance in common.
    ...sample(fc.tuple(sentence, sentence), 40).map(([one, other]) => [line(one), line(other)]),
    // Paragraphs, of which some are edited, put in or taken out.
    ...sample(
      fc.tuple(
        fc.array(sentence, { minLength: 3, maxLength: 6 }),
        fc.array(edit, { minLength: 1, maxLength: 5 }),
        edit,
      ),
      60,
    ).map(([lines, edits, { what, at, word: extra }]) => {
      const place = at % lines.length;
      const after = lines.map((words, i) => (i % 2 === at % 2 ? edited(words, edits) : words));
      const moved = after.toSpliced(place, what === 'insert' ? 0 : 1, ...(what === 'remove' ? [] : [[extra, 'first']]));
      return [lines, moved].map((texts) => texts.map(line).join('\n\n'));
    }),
  ] as [string, string][];

  it('edits of words, numbers and units: never more changed words than git and a tenth, in 220 pairs', () => {
    expect(many.length).toBe(220);
    for (const [from, to] of many) {
      const most = changedWords(git(from, to)) * 1.1;
      expect(changedWords(compareWords(from, to)), `${from}\n---\n${to}`).toBeLessThanOrEqual(most);
    }
  }, 60_000);

  it('never cuts a number from its sign, its decimals or its unit', () => {
    for (const [from, to] of many) {
      const runs = compareWords(from, to);
      for (const [text, own] of [
        [from, 'removed'],
        [to, 'added'],
      ] as const) {
        const cuts = new Set<number>();
        let at = 0;
        for (const { kind, text: part } of runs.filter(({ kind }) => kind === 'same' || kind === own)) {
          if (kind) cuts.add((at += part.length));
        }
        for (const { 0: value, index } of text.matchAll(
          new RegExp(`${NUMBER}( to ${NUMBER})?( ±[0-9.]+)?( ${UNIT}|°)`, 'gu'),
        ))
          for (let i = index + 1; i < index + value.length; i += 1)
            expect(cuts.has(i), `${value} in ${text}`).toBe(false);
      }
    }
  });
});
