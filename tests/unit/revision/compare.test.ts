import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { ENTRY_FIELDS, HEAD_FIELDS, isListName } from '@/domain/procedure/fields';
import type { Procedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { bodyText } from '@/domain/revision/bodyText';
import type { Comparison, WordRun } from '@/domain/revision/types';
import { pair, procedure } from './arbitraries';

const FOLDER = 'content/procedures';
const read = (file: string, edit: (source: string) => string = (s) => s): Procedure => {
  const parsed = parseProcedure(edit(readFileSync(`${FOLDER}/${file}`, 'utf8')));
  if (!parsed.ok) throw new Error(`${file}: ${parsed.errors.map((e) => e.message).join(' ')}`);
  return parsed.procedure;
};
const side = (runs: WordRun[], ...kinds: WordRun['kind'][]) =>
  runs.flatMap(({ kind, text }) => (kinds.includes(kind) ? [text] : [])).join('');
const clone = (p: Procedure): Procedure => structuredClone(p);

describe('a comparison', () => {
  it('applied to the old procedure gives the new one: steps, titles, words and cautions', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const { steps, intro } = compareProcedures(from, to);
        for (const [text, kept, place] of [
          [to, 'added', 'toNumber'],
          [from, 'removed', 'fromNumber'],
        ] as const) {
          const there = steps.filter((step) => step[place] !== null);
          if (place === 'fromNumber') there.sort((a, b) => (a.fromNumber ?? 0) - (b.fromNumber ?? 0));
          expect(there.map((step) => step[place])).toEqual(text.steps.map((_, i) => i + 1));
          expect(there.map(({ id }) => id)).toEqual(text.steps.map(({ id }) => id));
          expect(there.map(({ title }) => side(title, 'same', kept))).toEqual(text.steps.map(({ title }) => title));
          expect(there.map(({ body }) => side(body, 'same', kept))).toEqual(
            text.steps.map(({ body }) => bodyText(body, text.frontmatter)),
          );
          expect(there.map(({ cautions }) => cautions[place === 'toNumber' ? 'to' : 'from'])).toEqual(
            text.steps.map(({ cautions }) => cautions),
          );
          expect(side(intro, 'same', kept)).toBe(bodyText(text.intro, text.frontmatter));
        }
      }),
      { numRuns: 200 },
    );
  });

  it('names the fewest steps that can have moved', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const { steps } = compareProcedures(from, to);
        const stayed = steps.filter(
          ({ fromNumber, toNumber, moved }) => fromNumber !== null && toNumber !== null && !moved,
        );
        const places = stayed.map(({ fromNumber }) => fromNumber ?? 0);
        expect(places).toEqual([...places].sort((a, b) => a - b));
        for (const step of steps)
          if (step.fromNumber === null || step.toNumber === null) expect(step.moved).toBe(false);
      }),
    );
  });

  it('puts a removed step after the one that it followed', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const { steps } = compareProcedures(from, to);
        const ids = steps.map(({ id }) => id);
        for (const { id, kind, fromNumber } of steps)
          if (kind === 'removed')
            expect(ids[ids.indexOf(id) - 1] ?? null).toBe(from.steps[(fromNumber ?? 1) - 2]?.id ?? null);
      }),
    );
  });

  it('says identical exactly where nothing differs', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const same = JSON.stringify(sorted(from)) === JSON.stringify(sorted(to));
        expect(compareProcedures(from, to).identical).toBe(same);
      }),
      { numRuns: 200 },
    );
    fc.assert(
      fc.property(procedure, (p) => {
        const c = compareProcedures(p, clone(p));
        expect(c).toMatchObject({ identical: true, values: [], criticalReasons: [] });
        expect(c.steps.every(({ kind, moved }) => kind === 'same' && !moved)).toBe(true);
      }),
    );
  });

  it('mirrors itself: what one way adds, the other removes', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const mirror = { added: 'removed', removed: 'added', changed: 'changed' } as const;
        const key = (c: Comparison['values'][number]) => `${c.path} ${c.kind} ${c.from} ${c.to}`;
        const there = compareProcedures(from, to).values.map(key).sort();
        const back = compareProcedures(to, from).values.map((c) =>
          key({ ...c, kind: mirror[c.kind], from: c.to, to: c.from }),
        );
        expect(back.sort()).toEqual(there);
      }),
    );
  });

  it('takes what only comes to a sheet that is not critical for an ordinary change', () => {
    fc.assert(
      fc.property(procedure, procedure, (p, more) => {
        const base = { ...p, frontmatter: { ...p.frontmatter, critical: false } };
        const grown = clone(base);
        for (const list of ['torques', 'limits', 'cautions', 'parts'] as const) {
          const own = new Set(base.frontmatter[list].map(({ key }) => key));
          grown.frontmatter[list].push(...(more.frontmatter[list].filter(({ key }) => !own.has(key)) as never[]));
        }
        const ids = new Set(base.steps.map(({ id }) => id));
        grown.steps.push(...more.steps.filter(({ id }) => !ids.has(id)));
        expect(compareProcedures(base, grown).criticalReasons).toEqual([]);
      }),
    );
  });

  it('is critical where a torque, limit, caution, hold point or what happens to a part is lost or changed', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const { criticalReasons, identical } = compareProcedures(from, to);
        const kept = (list: 'torques' | 'limits' | 'cautions') =>
          from.frontmatter[list].every((old) => {
            const now = to.frontmatter[list].find(({ key }) => key === old.key);
            return (
              now && JSON.stringify(sorted({ ...now, source: 0 })) === JSON.stringify(sorted({ ...old, source: 0 }))
            );
          });
        const parts = from.frontmatter.parts.every(
          (old) => to.frontmatter.parts.find(({ key }) => key === old.key)?.action === old.action,
        );
        const holds = (p: Procedure) =>
          p.steps.map(({ body }) => (body.match(/<Hold>/g) ?? []).length).reduce((a, b) => a + b, 0);
        const marked = from.frontmatter.critical || to.frontmatter.critical;
        const mustBe =
          !kept('torques') || !kept('limits') || !kept('cautions') || !parts || holds(to) < holds(from) || marked;
        if (mustBe && !identical) expect(criticalReasons.length).toBeGreaterThan(0);
      }),
      { numRuns: 200 },
    );
  });
});

/** Object keys in one order, so that two equal things have one text; what is not set and what is empty are left out. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .filter(([, v]) => v !== undefined && v !== false && !(Array.isArray(v) && v.length === 0))
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([k, v]) => [k, sorted(v)]),
  );
}

describe('every field of a front matter', () => {
  // A field that the comparison forgets is a change that nobody reviews; the list of fields is the schema's own.
  const base = read('p-0142-valve-cover-reseal.mdx').frontmatter;
  const other = (value: unknown): unknown =>
    Array.isArray(value)
      ? [...value, ...value.slice(0, 1)]
      : typeof value === 'number'
        ? value + 1
        : typeof value === 'boolean'
          ? !value
          : value === undefined
            ? 'x'
            : `${String(value)} x`;
  const changed = (from: object, to: object) =>
    compareProcedures(
      { frontmatter: from as never, intro: '', steps: [] },
      { frontmatter: to as never, intro: '', steps: [] },
    );

  const heads = Object.keys(HEAD_FIELDS).filter((name) => !isListName(name));
  it.each(heads)('%s', (name) => {
    const c = changed(base, { ...base, [name]: name === 'system' ? 'fuel' : other(base[name as 'title']) });
    expect(c.values.map(({ path }) => path)).toEqual([name]);
    expect(c.identical).toBe(false);
  });

  const fields = Object.entries(ENTRY_FIELDS).flatMap(([list, names]) =>
    Object.keys(names)
      .filter((name) => name !== 'key')
      .map((name) => [list as keyof typeof ENTRY_FIELDS, name] as const),
  );
  it.each(fields)('%s.%s', (list, name) => {
    const entry = base[list].find((e) => Object.hasOwn(e, name)) ?? base[list][0];
    if (!entry) return expect.unreachable(`${list} is empty in the sample`);
    const value =
      { positions: [[0, 0]], passes: [1], angles: [90], order: [1], angleTolerance: 5, nominal: 1 }[name] ??
      other(entry[name as 'key']);
    const to = { ...base, [list]: base[list].map((e) => (e === entry ? { ...e, [name]: value } : e)) };
    const { values } = changed(base, to);
    expect(values.length).toBeGreaterThan(0);
    for (const { path } of values) expect(path.startsWith(`${list}.${entry.key}.`)).toBe(true);
    expect(values.some(({ path }) => path.startsWith(`${list}.${entry.key}.${name}`))).toBe(true);
    const guarded = ['torques', 'limits', 'cautions'].includes(list) && name !== 'source';
    const isCritical = guarded || (list === 'parts' && name === 'action');
    for (const { critical } of values) expect(critical !== null).toBe(isCritical);
  });
});

describe('the procedures of the book', () => {
  const files = readdirSync(FOLDER).filter((name) => name.endsWith('.mdx'));
  it.each(files)('%s reads without a component left over, and is identical with itself', (file) => {
    const p = read(file);
    for (const text of [p.intro, ...p.steps.map(({ body }) => body)])
      expect(bodyText(text, p.frontmatter)).not.toMatch(/<\/?[A-Z]/);
    expect(compareProcedures(p, read(file)).identical).toBe(true);
  });

  it('compares two of them in 10 ms, the fastest of ten', () => {
    const [from, to] = [read(files[0] ?? ''), read(files[1] ?? '')];
    const times = Array.from({ length: 10 }, () => {
      const start = performance.now();
      compareProcedures(from, to);
      return performance.now() - start;
    });
    expect(Math.min(...times)).toBeLessThan(10);
  });
});
