import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { toSource } from '@/domain/procedure/canonical';
import { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';
import { nextLetter } from '@/domain/revision/letters';
import { originsAfter, type Origins } from '@/domain/revision/origins';

/**
 * Held against `git blame` (Git's own answer to "since when does this line read so") on the canonical text of generated
 * histories in which each value has a line of its own and no two lines are alike. The mark: every such line, in every
 * history, comes from the same revision by both. Only what stands in its place is changed here: blame takes a moved line for
 * a new one, and where steps come and go it may pair their like closing lines otherwise. The diary of edits in
 * `tests/unit/revision/origins.test.ts` holds those.
 */

const TORQUES = 6;
const STEPS = 5;
/** `nm` and `body` by number; a step that is null is not in the text. */
interface State {
  nm: number[];
  body: (number | null)[];
}
const change = fc.record({
  torque: fc.nat(TORQUES - 1),
  step: fc.nat(STEPS - 1),
  what: fc.constantFrom('nm', 'reword'),
});
const histories = fc.array(fc.array(change, { minLength: 1, maxLength: 3 }), { minLength: 3, maxLength: 9 });

function textOf({ nm, body }: State): Procedure {
  return {
    frontmatter: Frontmatter.parse({
      title: 'Reseal the cover',
      summary: 'A sheet whose every value has a line of its own.',
      system: 'sealing',
      engines: ['tarn-t18f'],
      minutes: 5,
      skill: 'apprentice',
      torques: nm.map((value, i) => ({
        key: `bolt-${i}`,
        name: `Bolt ${i}`,
        thread: 'M6',
        pitch: 1,
        condition: 'dry',
        nm: value,
        count: 2 + i,
      })),
    }),
    intro: '',
    steps: body.flatMap((words, i) =>
      words === null
        ? []
        : [
            {
              id: `step-${i}`,
              title: `Step ${i} of the work`,
              cautions: [],
              body: `Do the work of step ${i} in way ${words}.`,
            },
          ],
    ),
  };
}

/** The place that a line of the canonical text holds; null for lines that are alike or that hold no value. */
function placeOf(line: string, state: State): string | null {
  const nm = /^ {4}nm: (\S+)$/.exec(line);
  if (nm) return `torques.bolt-${state.nm.indexOf(Number(nm[1]))}.nm`;
  const body = /^Do the work of step (\d)/.exec(line);
  if (body) return `step:step-${body[1]}:body`;
  const title = /^<Step id="(step-\d)"/.exec(line);
  return title ? `step:${title[1]}:title` : null;
}

function blame(folder: string, texts: readonly string[], letters: readonly string[]): string[] {
  const git = (...args: string[]) =>
    execFileSync('git', ['-c', 'user.name=T', '-c', 'user.email=t@t.example', '-c', 'commit.gpgsign=false', ...args], {
      cwd: folder,
      encoding: 'utf8',
      env: { ...process.env, GIT_CONFIG_GLOBAL: '/dev/null', GIT_CONFIG_SYSTEM: '/dev/null' },
    });
  git('init', '-q');
  texts.forEach((text, i) => {
    writeFileSync(join(folder, 'sheet.mdx'), text);
    git('add', 'sheet.mdx');
    git('commit', '-q', '--allow-empty', '-m', letters[i]!);
  });
  return [...git('blame', '--minimal', '--line-porcelain', 'sheet.mdx').matchAll(/^summary (\w+)$/gm)].map(
    (match) => match[1]!,
  );
}

test('every value and every step comes from the revision that git blame names', () => {
  let lines = 0;
  let later = 0;
  fc.assert(
    fc.property(histories, (history) => {
      // Numbers are given once, so that no two lines are alike and none comes back by chance.
      let fresh = 10;
      const next = () => (fresh += 1);
      const state: State = { nm: Array.from({ length: TORQUES }, next), body: Array.from({ length: STEPS }, next) };
      const texts: Procedure[] = [structuredClone(textOf(state))];
      for (const changes of history) {
        for (const { torque, step, what } of changes) {
          if (what === 'nm') state.nm[torque] = next();
          else state.body[step] = next();
        }
        texts.push(structuredClone(textOf(state)));
      }
      const letters: string[] = [];
      let origins: Origins | null = null;
      texts.forEach((text, i) => {
        const letter = nextLetter(letters.at(-1) ?? null);
        const before = texts[i - 1];
        origins = originsAfter(before && origins ? { text: before, origins } : null, text, letter);
        letters.push(letter);
      });
      const folder = mkdtempSync(join(tmpdir(), 'matchmark-blame-'));
      try {
        const sources = texts.map((text) => toSource(text));
        const blamed = blame(folder, sources, letters);
        sources
          .at(-1)!
          .replace(/\n$/, '')
          .split('\n')
          .forEach((line, i) => {
            const place = placeOf(line, state);
            if (place === null) return;
            lines += 1;
            if (blamed[i] !== 'A') later += 1;
            expect([line, origins![place]]).toEqual([line, blamed[i]]);
          });
      } finally {
        rmSync(folder, { recursive: true, force: true });
      }
    }),
    { numRuns: 12 },
  );
  expect(lines).toBeGreaterThan(100);
  expect(later, 'lines that a later revision wrote').toBeGreaterThan(20);
}, 120_000);
