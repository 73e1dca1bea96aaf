import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Procedure } from '@/domain/procedure/types';
import { Frontmatter } from '@/domain/procedure/schema';
import { placeOf, readAnchor } from '@/domain/review/anchors';
import { applySuggestion, valueSuggestion, type Suggestion } from '@/domain/review/suggestions';

const sheet = (bodies: readonly string[], nm = 10): Procedure => ({
  frontmatter: Frontmatter.parse({
    title: 'Reseal the test cover',
    summary: 'A short sheet.',
    system: 'sealing',
    engines: ['tarn-t18f'],
    minutes: 30,
    skill: 'apprentice',
    torques: ['cover-bolt', 'stud'].map((key) => ({
      key,
      name: key,
      thread: 'M6',
      pitch: 1,
      condition: 'dry',
      nm,
      passes: [5],
      count: 4,
    })),
  }),
  intro: '',
  steps: bodies.map((body, i) => ({ id: `s${i}`, title: `Step of words ${i}`, cautions: [], body })),
});

const word = fc.constantFrom(
  'wipe',
  'both',
  'faces',
  'a',
  'cloth',
  'the',
  'joint',
  'dry',
  '<Torque of="cover-bolt" />',
);
const body = fc.array(word, { minLength: 1, maxLength: 14 }).map((words) => words.join(' '));
const plain = fc
  .array(fc.constantFrom('new', 'clean', 'cloth', 'both', 'of'), { maxLength: 4 })
  .map((w) => w.join(' '));
const words = (quote: string, replacement: string): Suggestion => ({ kind: 'words', quote, replacement });
const withoutTags = (text: string) => text.replace(/<[^>]*>/g, '\0');
/** How often, overlapping ones too; written otherwise than the code that is tested. */
const times = (text: string, quote: string) =>
  [...text].filter((_, i) => text.slice(i, i + quote.length) === quote).length;

describe('suggested words', () => {
  it('are taken up where the quote stands exactly once, and nowhere else', () => {
    const seen = { taken: 0, refused: 0 };
    fc.assert(
      fc.property(
        fc.array(body, { minLength: 1, maxLength: 3 }),
        fc.nat(2),
        body,
        plain,
        (bodies, which, quote, instead) => {
          const procedure = sheet(bodies);
          const id = `s${which % bodies.length}`;
          const step = procedure.steps.find((one) => one.id === id)!;
          // Half of the quotes are cut out of the step itself.
          const said = quote.length % 2 ? quote : step.body.slice(0, quote.length).trim();
          const before = structuredClone(procedure);
          const result = applySuggestion(procedure, `step:${id}`, words(said, instead));
          expect(procedure, 'what is given stays as it is').toEqual(before);
          const once = times(withoutTags(step.body), said) === 1 && !said.includes('<');
          if (!result.ok) {
            seen.refused += 1;
            expect(result.why).toMatch(/\.$/);
            expect(!once || said === instead || step.body.replace(said, instead).trim() === step.body).toBe(true);
            return;
          }
          seen.taken += 1;
          expect(once).toBe(true);
          const after = result.procedure.steps.find((one) => one.id === id)!;
          expect(after.body).toBe(step.body.split(said).join(instead).trim());
          expect(result.procedure.steps.filter((one) => one.id !== id)).toEqual(
            before.steps.filter((one) => one.id !== id),
          );
          expect(result.procedure.frontmatter).toEqual(before.frontmatter);
        },
      ),
      { numRuns: 3000 },
    );
    expect(Math.min(seen.taken, seen.refused)).toBeGreaterThan(300);
  });

  it('never reach into a value, and bring none', () => {
    const procedure = sheet(['Tighten to <Torque of="cover-bolt" />.']);
    expect(applySuggestion(procedure, 'step:s0', words('cover-bolt', 'stud'))).toMatchObject({ ok: false });
    expect(applySuggestion(procedure, 'step:s0', words('Tighten', '<Torque of="stud" />'))).toMatchObject({
      ok: false,
    });
    expect(applySuggestion(procedure, 'step:gone', words('Tighten', 'Pull'))).toMatchObject({
      ok: false,
      why: 'The step that this was suggested for is no longer there.',
    });
    expect(applySuggestion(sheet(['A cloth, a cloth.']), 'step:s0', words('cloth', 'rag'))).toMatchObject({
      ok: false,
      why: expect.stringContaining('2 times') as string,
    });
  });
});

describe('a suggested value', () => {
  it('changes one field of one entry once, and is then refused', () => {
    fc.assert(
      fc.property(fc.integer({ min: 6, max: 40 }), fc.constantFrom('cover-bolt', 'stud'), (nm, key) => {
        const procedure = sheet(['Tighten.']);
        const anchor = `torques.${key}.nm`;
        const made = valueSuggestion(procedure, anchor, String(nm));
        if (nm === 10) {
          expect(made.ok).toBe(false);
          return;
        }
        if (!made.ok) throw new Error(made.why);
        const taken = applySuggestion(procedure, anchor, made.suggestion);
        if (!taken.ok) throw new Error(taken.why);
        const expected = structuredClone(procedure);
        expected.frontmatter.torques.find((t) => t.key === key)!.nm = nm;
        expect(taken.procedure).toEqual(expected);
        expect(applySuggestion(taken.procedure, anchor, made.suggestion).ok).toBe(false);
      }),
    );
  });

  it('is told in the unit of the sheet, and refused in words', () => {
    const procedure = sheet(['Tighten.']);
    expect(valueSuggestion(procedure, 'torques.cover-bolt.nm', ' 11,5 ')).toEqual({
      ok: true,
      suggestion: { kind: 'value', from: 10, to: 11.5, fromText: '10 N·m', toText: '11.5 N·m' },
    });
    const why = (anchor: string | null, typed: string) => {
      const made = valueSuggestion(procedure, anchor, typed);
      return made.ok ? null : made.why;
    };
    expect(why('torques.cover-bolt.nm', '12 Nm')).toContain('a number, without its unit');
    expect(why('torques.cover-bolt.nm', '4')).toContain('below the final torque');
    expect(why('torques.cover-bolt.nm', '-4')).toContain('more than zero');
    expect(why('torques.cover-bolt.passes', '4')).toContain('One value');
    expect(why('torques.cover-bolt.key', 'x')).toContain('One value');
    expect(why('torques.gone.nm', '12')).toContain('no such value');
    expect(why(null, '12')).toContain('one field');
    // The author changed it meanwhile: what was suggested was suggested in place of another value.
    const made = valueSuggestion(procedure, 'torques.cover-bolt.nm', '11');
    if (!made.ok) throw new Error(made.why);
    expect(applySuggestion(sheet(['Tighten.'], 12), 'torques.cover-bolt.nm', made.suggestion)).toMatchObject({
      ok: false,
      why: expect.stringContaining('in place of 10 N·m, and the text says 12 N·m now') as string,
    });
  });
});

describe('an anchor', () => {
  it('follows its step and its entry wherever they move, and knows when they are gone', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([0, 1, 2, 3], { minLength: 1 }), fc.boolean(), (order, turned) => {
        const old = sheet(['A.', 'B.', 'C.', 'D.']);
        const moved: Procedure = {
          ...old,
          steps: order.map((i) => ({ ...old.steps[i]!, body: 'Other words.' })),
          frontmatter: {
            ...old.frontmatter,
            torques: turned ? old.frontmatter.torques.toReversed() : old.frontmatter.torques,
          },
        };
        for (const i of [0, 1, 2, 3])
          expect(placeOf(moved, `step:s${i}`)).toBe(
            order.includes(i) ? `step ${order.indexOf(i) + 1}, Step of words ${i}` : null,
          );
        expect(placeOf(moved, 'torques.stud.nm')).toBe('stud');
        expect(placeOf(moved, 'torques.stud.tolerance')).toBe('stud: tolerance');
        expect(placeOf(moved, 'torques.stud.passes.0')).toBe('stud: first pass');
        expect(placeOf(moved, 'torques.gone.nm')).toBeNull();
      }),
    );
  });

  it('is read, or it is none', () => {
    expect(readAnchor(null)).toEqual({ to: 'whole' });
    expect(readAnchor('limits.gap')).toEqual({ to: 'value', list: 'limits', key: 'gap', field: null });
    for (const bad of ['', 'step:', 'nothing', 'nothing.there', 'torques.a.__proto__', 'constructor', '__proto__.a'])
      expect([bad, readAnchor(bad)]).toEqual([bad, undefined]);
  });
});
