import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { KEYED_LISTS } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';
import { merge, resolve } from '@/domain/revision/merge';
import { rawOf } from '@/domain/revision/mergeSame';
import type { Choices, Conflict, Side } from '@/domain/revision/mergeTypes';
import { SAMPLE } from '../procedure/sample';
import { procedure, pair, triple } from './arbitraries';

const read = (source: string): Procedure => {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(parsed.errors[0]?.message);
  return parsed.procedure;
};
const base = read(SAMPLE);
const of = (...changes: [string, string][]) =>
  read(changes.reduce((text, [from, to]) => (expect(text).toContain(from), text.replace(from, to)), SAMPLE));
const all = (conflicts: readonly Conflict[], take: Side): Choices =>
  Object.fromEntries(conflicts.map(({ path }) => [path, { take }]));
/** Every conflict answered with one side, those too that come up by answering. */
function resolved(b: Procedure, m: Procedure, t: Procedure, take: Side) {
  let merged = merge(b, m, t);
  for (let round = 0; round < 4; round += 1) merged = merge(b, m, t, all(merged.conflicts, take));
  return merged;
}
const whole = fc.oneof(triple, fc.tuple(procedure, procedure, procedure));

describe('the laws of a merge', () => {
  it('takes the side that changed, and what both made alike, without asking', () => {
    fc.assert(
      fc.property(pair, ([b, x]) => {
        for (const [mine, theirs] of [
          [b, x],
          [x, b],
          [x, x],
        ] as const) {
          const merged = merge(b, mine, theirs);
          expect(merged.conflicts).toEqual([]);
          expect(rawOf(merged.procedure)).toBe(rawOf(x));
        }
      }),
      { numRuns: 150 },
    );
  });

  it('is the same from the other side', () => {
    fc.assert(
      fc.property(whole, ([b, m, t]) => {
        const [one, other] = [merge(b, m, t), merge(b, t, m)];
        expect(rawOf(other.procedure)).toBe(rawOf(one.procedure));
        const told = ({ path, base: was, mine, theirs }: Conflict) => [path, was, mine, theirs];
        const swapped = ({ path, base: was, mine, theirs }: Conflict) => [path, was, theirs, mine];
        const inOrder = (list: unknown[][]) => list.sort((a, b) => (String(a[0]) < String(b[0]) ? -1 : 1));
        expect(inOrder(other.conflicts.map(swapped))).toEqual(inOrder(one.conflicts.map(told)));
      }),
      { numRuns: 150 },
    );
  });

  it('has each key and step once, asks each thing once, and tells three values apart', () => {
    fc.assert(
      fc.property(whole, ([b, m, t]) => {
        const { procedure: merged, conflicts } = merge(b, m, t);
        for (const keys of [
          merged.steps.map(({ id }) => id),
          conflicts.map(({ path }) => path),
          ...KEYED_LISTS.map((list) => merged.frontmatter[list].map(({ key }) => key)),
        ])
          expect(new Set(keys).size).toBe(keys.length);
        for (const { mine, theirs } of conflicts) expect(rawOf(mine)).not.toBe(rawOf(theirs));
      }),
      { numRuns: 150 },
    );
  });

  it.each(['mine', 'theirs'] as const)('answered with %s, loses no clean edit of the other side', (take) => {
    fc.assert(
      fc.property(whole, ([b, m, t]) => {
        const { procedure: merged, conflicts } = resolved(b, m, t, take);
        const asked = (path: string) =>
          conflicts.some((c) => c.path === path || c.path.startsWith(`${path}.`) || path.startsWith(`${c.path}.`));
        const clean = <T>(path: string, value: (p: Procedure) => T) => {
          const [was, mine, theirs, now] = [b, m, t, merged].map((p) => rawOf(value(p)));
          if (asked(path)) return;
          if (was === mine) expect(now, path).toBe(theirs);
          else if (was === theirs) expect(now, path).toBe(mine);
        };
        for (const name of ['title', 'summary', 'system', 'minutes', 'skill'] as const)
          clean(name, (p) => p.frontmatter[name]);
        for (const list of KEYED_LISTS)
          for (const key of new Set([b, m, t].flatMap((p) => p.frontmatter[list].map((e) => e.key))))
            clean(`${list}.${key}`, (p) => p.frontmatter[list].find((e) => e.key === key));
        for (const id of new Set([b, m, t].flatMap((p) => p.steps.map((s) => s.id)))) {
          const step = (p: Procedure) => p.steps.find((s) => s.id === id);
          const there = [b, m, t].every(step);
          if (there) clean(`steps.${id}.title`, (p) => step(p)?.title);
          if (there) clean(`steps.${id}.body`, (p) => step(p)?.body);
          clean(`steps.${id}`, (p) => step(p) !== undefined);
        }
        clean('intro', (p) => p.intro);
      }),
      { numRuns: 150 },
    );
  });
});

describe('values', () => {
  it('brings different fields of the head and of a part together', () => {
    const mine = of(['minutes: 70', 'minutes: 80'], ['quantity: 1', 'quantity: 2']);
    const theirs = of(['skill: apprentice', 'skill: senior'], ['Cover gasket, moulded', 'Cover gasket, rubber']);
    const { procedure: merged, conflicts } = merge(base, mine, theirs);
    expect(conflicts).toEqual([]);
    expect(merged.frontmatter).toMatchObject({ minutes: 80, skill: 'senior' });
    expect(merged.frontmatter.parts[0]).toMatchObject({ name: 'Cover gasket, rubber', quantity: 2 });
  });

  it.each([
    ['torques.cover-bolt', ['nm: 10', 'nm: 12'], ['condition: dry', 'condition: oiled']],
    ['limits.gap', ['max: 0.05', 'max: 0.1'], ['condition: cold', 'condition: warm']],
    ['cautions.hot-oil', ['signal: WARNING', 'signal: DANGER'], ['harm: burn skin at once', 'harm: burn']],
  ] as [string, [string, string], [string, string]][])(
    'asks about all of %s where each side changed another field of it',
    (path, one, other) => {
      const merged = merge(base, of(one), of(other));
      expect(merged.conflicts.map((c) => [c.path, c.kind, c.reason])).toEqual([[path, 'entry', 'both']]);
      const [conflict] = merged.conflicts;
      expect(conflict?.says.mine).not.toBe(conflict?.says.theirs);
      expect(rawOf(resolve(merged, { [path]: { take: 'mine' } }))).toBe(rawOf(of(one)));
      expect(rawOf(resolve(merged, { [path]: { take: 'theirs' } }))).toBe(rawOf(of(other)));
      expect(rawOf(resolve(merged, { [path]: { take: 'base' } }))).toBe(rawOf(base));
    },
  );

  it('takes a torque whole where one side changed what the other did and more', () => {
    const theirs = of(['nm: 10', 'nm: 12'], ['condition: dry', 'condition: oiled']);
    const merged = merge(base, of(['nm: 10', 'nm: 12']), theirs);
    expect([merged.conflicts, rawOf(merged.procedure)]).toEqual([[], rawOf(theirs)]);
  });

  it('takes a typed value', () => {
    const merged = merge(base, of(['minutes: 70', 'minutes: 80']), of(['minutes: 70', 'minutes: 90']));
    expect(merged.conflicts[0]).toMatchObject({
      path: 'minutes',
      label: 'Bench time',
      says: { base: '1 h 10 min', mine: '1 h 20 min', theirs: '1 h 30 min' },
    });
    expect(resolve(merged, { minutes: { take: 'typed', value: 85 } }).frontmatter.minutes).toBe(85);
  });
});

const without = (p: Procedure, id: string): Procedure => ({ ...p, steps: p.steps.filter((s) => s.id !== id) });
const withBody = (p: Procedure, id: string, change: (body: string) => string): Procedure => ({
  ...p,
  steps: p.steps.map((s) => (s.id === id ? { ...s, body: change(s.body) } : s)),
});
const added = (p: Procedure, after: string, id: string): Procedure => ({
  ...p,
  steps: p.steps.flatMap((s) => (s.id === after ? [s, { id, title: id, cautions: [], body: 'Wait.' }] : [s])),
});
const ids = (p: Procedure) => p.steps.map(({ id }) => id).join(' ');
const arranged = (p: Procedure, order: string): Procedure => ({
  ...p,
  steps: order.split(' ').flatMap((id) => p.steps.filter((s) => s.id === id)),
});

describe('steps', () => {
  it('puts new steps behind those that they followed, also where the other side moved others', () => {
    expect(ids(base)).toBe('cool draw-down check');
    const merged = merge(base, added(base, 'cool', 'mine'), added(base, 'check', 'theirs'));
    expect([ids(merged.procedure), merged.conflicts]).toEqual(['cool mine draw-down check theirs', []]);
  });

  it('asks for the order where both put a new step into one place', () => {
    const merged = merge(base, added(base, 'cool', 'wipe'), added(base, 'cool', 'drain'));
    expect(merged.conflicts.map(({ path }) => path)).toEqual(['order.steps']);
    const by = (take: Side) => ids(resolve(merged, { 'order.steps': { take } }));
    expect([by('mine'), by('theirs')]).toEqual(['cool wipe drain draw-down check', 'cool drain wipe draw-down check']);
  });

  it('asks for the order where both moved steps and not alike', () => {
    const [mine, theirs] = [arranged(base, 'check cool draw-down'), arranged(base, 'draw-down cool check')];
    const merged = merge(base, mine, theirs);
    expect(merged.conflicts.map(({ path, kind }) => [path, kind])).toEqual([['order.steps', 'order']]);
    expect(ids(resolve(merged, { 'order.steps': { take: 'theirs' } }))).toBe(ids(theirs));
  });

  it('asks where one took a step away and the other edited it', () => {
    const edited = withBody(base, 'check', (body) => `${body}\n\nLook again.`);
    const merged = merge(base, edited, without(base, 'check'));
    expect(merged.conflicts).toMatchObject([
      { path: 'steps.check', kind: 'step', reason: 'theirsRemoved', theirs: null },
    ]);
    expect(ids(resolve(merged, { 'steps.check': { take: 'theirs' } }))).toBe('cool draw-down');
    expect(rawOf(resolve(merged, { 'steps.check': { take: 'mine' } }))).toBe(rawOf(edited));
  });

  it('asks where one took a step away that the other moved', () => {
    const merged = merge(base, arranged(base, 'check cool draw-down'), without(base, 'check'));
    expect(merged.conflicts).toMatchObject([{ path: 'steps.check', reason: 'theirsRemoved' }]);
    expect(merge(base, arranged(base, 'check cool draw-down'), without(base, 'cool')).conflicts).toEqual([]);
  });

  it('keeps clean paragraphs of both where another paragraph of the step conflicts', () => {
    const start = withBody(base, 'check', () => 'One.\n\nTwo.\n\nThree.\n\nFour.\n\nFive.');
    const mine = withBody(start, 'check', (body) => body.replace('One.', 'One, mine.').replace('Three.', 'Mine.'));
    const theirs = withBody(start, 'check', (body) =>
      body.replace('Five.', 'Five, theirs.').replace('Three.', 'Theirs.'),
    );
    const merged = merge(start, mine, theirs);
    expect(merged.conflicts).toMatchObject([
      {
        path: 'steps.check.body',
        kind: 'text',
        base: 'One, mine.\n\nTwo.\n\nThree.\n\nFour.\n\nFive, theirs.',
        mine: 'One, mine.\n\nTwo.\n\nMine.\n\nFour.\n\nFive, theirs.',
        theirs: 'One, mine.\n\nTwo.\n\nTheirs.\n\nFour.\n\nFive, theirs.',
      },
    ]);
  });
});

describe('what words point at', () => {
  it('asks where theirs took away what mine puts to use, and keeps it until that is answered', () => {
    const start = of(['timers:\n', 'timers:\n  - key: dry\n    name: Let it dry\n    kind: wait\n    minutes: 5\n']);
    const theirs: Procedure = {
      ...start,
      frontmatter: { ...start.frontmatter, timers: start.frontmatter.timers.filter(({ key }) => key !== 'dry') },
    };
    const mine = withBody(start, 'check', (body) => `${body}\n\nWait <Timer of="dry" />.`);
    const merged = merge(start, mine, theirs);
    expect(merged.conflicts).toMatchObject([{ path: 'timers.dry', kind: 'entry', reason: 'reference', theirs: null }]);
    expect(merged.procedure.frontmatter.timers.map(({ key }) => key)).toContain('dry');
    const left = resolve(merged, { 'timers.dry': { take: 'theirs' } });
    expect(left.frontmatter.timers.map(({ key }) => key)).not.toContain('dry');
  });

  it('asks where theirs took a pass away that mine points at', () => {
    const theirs = of(['    passes: [5]\n', ''], [' pass="1"', '']);
    const mine = withBody(base, 'check', (body) => `${body}\n\nFirst <Torque of="cover-bolt" pass="1" />.`);
    expect(merge(base, mine, theirs).conflicts).toMatchObject([{ path: 'torques.cover-bolt', reason: 'reference' }]);
  });
});
