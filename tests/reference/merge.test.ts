import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { toSource } from '@/domain/procedure/canonical';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Procedure } from '@/domain/procedure/types';
import { merge } from '@/domain/revision/merge';
import type { Conflict, Merge } from '@/domain/revision/mergeTypes';
import { chanceOf, type Chance, edited } from './mergeEdits';

/**
 * Our merge against `git merge-file -p` (seen: run here on the same canonical texts). What git merges without a
 * conflict, ours does too and to the same text; where it does not, it must be for one of the named reasons, in each of
 * which the text that git makes is one that nobody wrote.
 */

const git = spawnSync('git', ['--version']).status === 0;
const folder = mkdtempSync(join(tmpdir(), 'merge-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** The text that git makes, or null where it reports a conflict. */
function byGit(base: string, mine: string, theirs: string): string | null {
  for (const [name, text] of Object.entries({ base, mine, theirs })) writeFileSync(join(folder, name), text);
  const { status, stdout } = spawnSync('git', ['merge-file', '-p', 'mine', 'base', 'theirs'], {
    cwd: folder,
    encoding: 'utf8',
  });
  return status === 0 ? stdout : null;
}

const read = (source: string): Procedure | null => {
  const parsed = parseProcedure(source);
  return parsed.ok ? parsed.procedure : null;
};
const entry = (p: Procedure, list: 'torques' | 'limits' | 'cautions', key: string) =>
  JSON.stringify((p.frontmatter[list] as { key: string }[]).find((e) => e.key === key));

const ids = (p: Procedure) => p.steps.map(({ id }) => id);
const orderOf = (p: Procedure) => ids(p).join(' ');

/** Why it is safer to ask about a thing that git merges without a word; null where it is not. */
function whyAsk({ path, reason }: Conflict, merged: Procedure, { base, mine, theirs }: Merge['texts']): string | null {
  const [list = '', key = ''] = path.split('.');
  if (list === 'torques' || list === 'limits' || list === 'cautions') {
    const made = entry(merged, list, key);
    if (made !== entry(mine, list, key) && made !== entry(theirs, list, key))
      return 'pieces a torque, limit or caution together';
  }
  if (list === 'steps' && ids(mine).includes(key) !== ids(theirs).includes(key) && ids(base).includes(key))
    return 'keeps or drops a step that one took away and the other moved';
  if (path === 'order.steps' && new Set([base, mine, theirs, merged].map(orderOf)).size === 4)
    return 'makes an order of steps that nobody wrote';
  return reason === 'reference' ? 'points at what is gone' : null;
}

/** What git does that ours does not, one reason for every difference; null where one has none. */
function safer(text: string, { conflicts, texts }: Merge): string[] | null {
  const merged = read(text);
  if (!merged) return ['makes a text that cannot be read'];
  const why = conflicts.map((conflict) => whyAsk(conflict, merged, texts));
  return why.length === 0 || why.includes(null) ? null : why.filter((one) => one !== null);
}

const FILES = readdirSync('content/procedures')
  .filter((name) => name.endsWith('.mdx'))
  .sort();

/** Reading so many texts takes a while; 1500 were run when this was written. */
const COUNT = 140;

function* cases(count: number): Generator<{ base: Procedure; mine: Procedure; theirs: Procedure }> {
  for (let i = 0; i < count; i += 1) {
    const chance: Chance = chanceOf(i + 1);
    const base = read(readFileSync(join('content/procedures', FILES[i % FILES.length] ?? ''), 'utf8'));
    if (!base) throw new Error(`${FILES[i % FILES.length]} cannot be read`);
    const by = (who: string): Procedure => {
      for (;;) {
        const text = edited(base, chance, who);
        // An edit that is refused anyhow, such as to take away the limit that a table is read against, is drawn again.
        if (read(toSource(text))) return text;
      }
    };
    yield { base, mine: by('mine'), theirs: by('theirs') };
  }
}

describe.skipIf(!git)(git ? 'merge, against git merge-file' : 'merge, against git: git is not on this machine', () => {
  it('merges generated pairs of edits as git does, or more safely', () => {
    const counts = { same: 0, bothAsk: 0, onlyGitAsks: 0 };
    const reasons: Record<string, number> = {};
    const wrong: string[] = [];
    let n = 0;
    for (const { base, mine, theirs } of cases(COUNT)) {
      n += 1;
      const text = byGit(toSource(base), toSource(mine), toSource(theirs));
      const ours = merge(base, mine, theirs);
      if (text === null) {
        counts[ours.conflicts.length > 0 ? 'bothAsk' : 'onlyGitAsks'] += 1;
        continue;
      }
      if (ours.conflicts.length === 0 && toSource(ours.procedure) === text) {
        counts.same += 1;
        continue;
      }
      const why = safer(text, ours);
      if (why) for (const one of why) reasons[one] = (reasons[one] ?? 0) + 1;
      else
        wrong.push(
          `case ${n}: ${ours.conflicts.map(({ path, reason }) => `${path} ${reason}`).join(', ') || 'another text'}`,
        );
    }
    if (process.env.MERGE_COUNTS) process.stderr.write(`${JSON.stringify({ counts, reasons })}\n`);
    expect(wrong).toEqual([]);
    // Enough of every kind that the comparison says something.
    expect(counts.same).toBeGreaterThan(80);
    expect(counts.bothAsk).toBeGreaterThan(12);
    expect(reasons['pieces a torque, limit or caution together']).toBeGreaterThan(1);
  }, 120_000);
});
