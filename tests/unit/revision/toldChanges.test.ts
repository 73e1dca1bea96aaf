import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Procedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { toldChanges } from '@/domain/revision/toldChanges';

const read = (file: string): Procedure => {
  const parsed = parseProcedure(readFileSync(`content/procedures/${file}`, 'utf8'));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors));
  return parsed.procedure;
};
const base = read('p-0142-valve-cover-reseal.mdx');
const [bolt] = base.frontmatter.torques;
const withHead = (change: Partial<Procedure['frontmatter']>): Procedure => ({
  ...base,
  frontmatter: { ...base.frontmatter, ...change },
});
const torques = (change: Partial<NonNullable<typeof bolt>>) =>
  base.frontmatter.torques.map((torque) => (torque === bolt ? { ...torque, ...change } : torque));

it('says the value that was and the one that is, with their unit', () => {
  const nm = bolt!.nm + 2;
  expect(toldChanges(base, withHead({ torques: torques({ nm }) }))).toEqual([
    `a torque changes: ${bolt!.name} torque, ${bolt!.nm} to ${nm} N·m`,
  ]);
});

it('says what was removed by its name', () => {
  const [limit] = base.frontmatter.limits;
  const told = toldChanges(base, withHead({ limits: base.frontmatter.limits.slice(1) }));
  expect(told).toContain(`a limit is removed: ${limit!.name}`);
});

it('says nothing of an ordinary change', () => {
  expect(toldChanges(base, withHead({ summary: 'Other words.' }))).toEqual([]);
  expect(toldChanges(base, base)).toEqual([]);
});

it('on a sheet that is marked critical says whatever changes', () => {
  const marked = withHead({ critical: true });
  const [first, ...rest] = base.steps;
  const to: Procedure = {
    ...marked,
    frontmatter: { ...marked.frontmatter, minutes: base.frontmatter.minutes + 5 },
    steps: [{ ...first!, body: 'Other words.' }, ...rest],
  };
  expect(base.frontmatter.minutes).toBe(70);
  expect(toldChanges(marked, to).at(-1)).toBe(
    `the sheet is marked critical, and this changes: Bench time, 1 h 10 min to 1 h 15 min; Step “${first!.title}”, reworded`,
  );
});

it('tells something of each critical reason, in their order, whatever changes', () => {
  const shuffled = fc.record({
    nm: fc.constantFrom(undefined, 5, 9, 16),
    tolerance: fc.constantFrom(undefined, 0.5, 2),
    critical: fc.boolean(),
    dropped: fc.nat(base.steps.length),
    limits: fc.nat(base.frontmatter.limits.length),
  });
  fc.assert(
    fc.property(shuffled, ({ nm, tolerance, critical, dropped, limits }) => {
      const to: Procedure = {
        ...withHead({
          critical,
          torques: torques({ ...(nm && { nm }), ...(tolerance && { tolerance }) }),
          limits: base.frontmatter.limits.slice(0, limits),
        }),
        steps: base.steps.filter((_, i) => i !== dropped),
      };
      const { criticalReasons, identical } = compareProcedures(base, to);
      const told = toldChanges(base, to);
      if (identical) return;
      expect(told.length).toBe(criticalReasons.length);
      const kinds = (words: readonly string[]) => words.map((one) => one.split(/[:,]/)[0]);
      expect(kinds(told)).toEqual(kinds(criticalReasons));
    }),
    { numRuns: 60 },
  );
});
