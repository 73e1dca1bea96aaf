import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { toSource } from '@/domain/procedure/canonical';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Procedure, Step } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { merge } from '@/domain/revision/merge';
import { root } from '../steps.mjs';

/** A real sheet, its steps repeated under new ids until the text has as many lines. */
function longSheet(lines: number): Procedure {
  const parsed = parseProcedure(readFileSync(join(root, 'content/procedures/p-0142-valve-cover-reseal.mdx'), 'utf8'));
  if (!parsed.ok) throw new Error('The valve-cover sheet does not parse.');
  const { steps, ...sheet } = parsed.procedure;
  const repeated: Step[] = [];
  for (let n = 0; toSource({ ...sheet, steps: repeated }).split('\n').length < lines; n += 1) {
    const step = steps[n % steps.length];
    if (step) repeated.push({ ...step, id: `${step.id}-${n}` });
  }
  return { ...sheet, steps: repeated };
}

/** The same with other torques and every third step reworded; `from` says which third. */
function reworked(sheet: Procedure, from: number, torque: number): Procedure {
  const { frontmatter, steps } = sheet;
  return {
    ...sheet,
    frontmatter: {
      ...frontmatter,
      torques: frontmatter.torques.map((entry) => ({ ...entry, nm: entry.nm * torque })),
    },
    steps: steps.map((step, i) =>
      i % 3 !== from ? step : { ...step, body: step.body.replace(/\bthe\b/g, 'each').replace(/\.$/m, ', then look.') },
    ),
  };
}

/** Milliseconds of one call: the middle and the 95th of 100. */
function timed(act: () => unknown): { middle: number; p95: number } {
  const times: number[] = [];
  for (let i = 0; i < 130; i += 1) {
    const from = performance.now();
    act();
    if (i >= 30) times.push(performance.now() - from);
  }
  times.sort((a, b) => a - b);
  return { middle: times[50] ?? NaN, p95: times[95] ?? NaN };
}

/** How long comparing and merging takes at 300 lines, and how much longer a line takes at 2,000 than at 300. */
export function compareAndMerge() {
  const measure = (lines: number) => {
    const base = longSheet(lines);
    const [mine, theirs] = [reworked(base, 0, 1.2), reworked(base, 1, 1)];
    const actual = toSource(base).split('\n').length;
    return {
      lines: actual,
      compare: timed(() => compareProcedures(base, mine)),
      merge: timed(() => merge(base, mine, theirs)),
    };
  };
  const [short, long] = [measure(300), measure(2000)];
  const perLine = (act: 'compare' | 'merge') => long[act].middle / long.lines / (short[act].middle / short.lines);
  return {
    lines: [short.lines, long.lines] as const,
    compare: { p95: short.compare.p95, growth: perLine('compare') },
    merge: { p95: short.merge.p95, growth: perLine('merge') },
  };
}
