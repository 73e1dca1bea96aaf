import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { KEYED_LISTS } from '@/domain/procedure/schema';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Procedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { takesBack } from '@/domain/revision/takesBack';
import { changed, SAMPLE } from '../procedure/sample';
import { pair, procedure } from './arbitraries';

function read(source: string): Procedure {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(parsed.errors[0]?.message);
  return parsed.procedure;
}
const B = read(SAMPLE);
/** What C did, told of a proposal on C that says what B said. */
const undone = (c: Procedure) => takesBack({ before: B, revised: c }, c, B).map(({ words }) => words);
const said = (from: string, to: string) => undone(read(changed(from, to)));
const places = (...given: Parameters<typeof takesBack>) => takesBack(...given).map(({ place }) => place);

describe('what a proposal takes back, in words', () => {
  it('tells a torque, a pass and a limit with both values, the unit said once', () => {
    expect(said('nm: 10\n', 'nm: 12\n')).toEqual(['Cover bolt torque, 10 to 12 N·m']);
    expect(said('passes: [5]', 'passes: [6]')).toEqual(['Cover bolt: first pass, 5 to 6 N·m']);
    expect(said('max: 0.05', 'max: 0.08')).toEqual(['Gap at the corner: most, 0.05 to 0.08 mm']);
    expect(said('minutes: 10\n', 'minutes: 90\n')).toEqual(['Soak the baffle, 10 min to 1 h 30 min']);
  });

  it('names a sentence without telling it', () => {
    expect(said('avoid: Let the engine cool.', 'avoid: Let the engine cool until you can rest a hand on it.')).toEqual([
      'Hot oil and hot metal: how to avoid',
    ]);
  });

  it('tells what came or went as a whole', () => {
    const timer = '  - key: soak\n    name: Soak the baffle\n    kind: soak\n    minutes: 10\n';
    const more = changed(timer, `${timer}  - key: stand\n    name: Let it stand\n    kind: wait\n    minutes: 5\n`);
    expect(undone(read(more))).toEqual(['Let it stand (time), added']);
    expect(said('passes: [5]\n', 'passes: [5, 8]\n')).toEqual(['Cover bolt: second pass, added']);
    expect(takesBack({ before: read(more), revised: B }, B, read(more)).map(({ words }) => words)).toEqual([
      'Let it stand (time), removed',
    ]);
  });

  it('tells a step by its title, the introduction, and the order of the steps', () => {
    expect(said('Disconnect the battery.', 'Disconnect the battery, minus first.')).toEqual([
      'the words of step “Let it cool”',
    ]);
    const check = SAMPLE.slice(SAMPLE.indexOf('<Step id="check"'));
    const without = read(SAMPLE.replace(check, ''));
    expect(undone(without)).toEqual(['step “Look for leaks”, removed']);
    expect(takesBack({ before: without, revised: B }, B, without)).toEqual([
      { place: 'step:check', words: 'step “Look for leaks”, added' },
    ]);
    expect(said('with the engine in the frame', 'with the engine out')).toEqual(['the words of the introduction']);
    expect(undone({ ...B, steps: B.steps.toReversed() })).toEqual(['the order of the steps']);
  });

  it('does not tell a step again that only shows a value that is taken back', () => {
    const c = read(changed('nm: 10\n', 'nm: 12\n'));
    expect(places({ before: B, revised: c }, c, B)).toEqual(['torques.cover-bolt.nm']);
  });

  it('says nothing of a value that goes on to a third one', () => {
    const [c, d] = [read(changed('nm: 10\n', 'nm: 12\n')), read(changed('nm: 10\n', 'nm: 11\n'))];
    expect(places({ before: B, revised: c }, c, d)).toEqual([]);
  });

  it('looks back over a later revision that left the value alone, and not over one that changed it', () => {
    const c = read(changed('nm: 10\n', 'nm: 12\n'));
    const later = { ...c, frontmatter: { ...c.frontmatter, minutes: 75 } };
    expect(places({ before: B, revised: c }, later, B)).toEqual(['torques.cover-bolt.nm']);
    const again = read(changed('nm: 10\n', 'nm: 13\n'));
    expect(places({ before: B, revised: c }, again, B)).toEqual([]);
  });
});

/** The fields of an entry, each as it is stored; a number of a limit is another one in another unit. */
function fields(entry: Record<string, unknown>): Map<string, string> {
  const flat = new Map<string, string>();
  for (const [name, value] of Object.entries(entry)) {
    if (value === undefined || name === 'key') continue;
    if (Array.isArray(value) && (name === 'passes' || name === 'angles'))
      value.forEach((one, i) => flat.set(`${name}.${i}`, JSON.stringify(one)));
    else flat.set(name, JSON.stringify([value, typeof value === 'number' ? entry['unit'] : null]));
  }
  return flat;
}

/** By a plain model that knows nothing of the comparison: what of entries, steps and introduction is set back. */
function expected(before: Procedure, base: Procedure, now: Procedure): string[] {
  const found: string[] = [];
  const back = (a: string | undefined, b: string | undefined, c: string | undefined) => a !== b && a === c;
  if (back(before.intro, base.intro, now.intro)) found.push('intro');
  for (const id of 'abcdefgh') {
    const step = ({ steps }: Procedure) => JSON.stringify(steps.find((one) => one.id === id));
    if (back(step(before), step(base), step(now))) found.push(`step:${id}`);
  }
  for (const list of KEYED_LISTS) {
    const entries = (of: Procedure) => of.frontmatter[list] as Record<string, unknown>[];
    const all = [before, base, now].flatMap(entries);
    for (const key of new Set(all.map((entry) => String(entry['key'])))) {
      const [a, b, c] = [before, base, now].map((of) => entries(of).find((entry) => entry['key'] === key));
      if (a && b && c) {
        const [x, y, z] = [fields(a), fields(b), fields(c)];
        for (const name of new Set([...x.keys(), ...y.keys()]))
          if (back(x.get(name), y.get(name), z.get(name))) found.push(`${list}.${key}.${name}`);
      } else if (!a !== !b && back(JSON.stringify(a), JSON.stringify(b), JSON.stringify(c)))
        found.push(`${list}.${key}`);
    }
  }
  return found.sort();
}

describe('what is taken back', () => {
  const three = fc.tuple(pair, procedure);

  it('is nothing where nothing was changed by the revision, or nothing is by the proposal', () => {
    fc.assert(
      fc.property(three, ([[a, b], c]) => {
        expect(places({ before: a, revised: a }, a, c)).toEqual([]);
        expect(places({ before: a, revised: b }, b, b)).toEqual([]);
      }),
    );
  });

  it('is all that the revision changed where the proposal is the text before it', () => {
    fc.assert(
      fc.property(pair, ([a, b]) => {
        const found = new Set(places({ before: a, revised: b }, b, a));
        const { values, identical } = compareProcedures(a, b);
        for (const { path } of values) expect(found).toContain(path);
        expect(found.size > 0).toBe(!identical);
      }),
    );
  });

  it('is just what the text before and the proposal share against the base, by a plain model', () => {
    fc.assert(
      fc.property(three, fc.nat(15), ([[a, b], other], mix) => {
        // A proposal that is now the old text, now the new one, now neither.
        const [front, intro, steps] = [mix & 1 ? a : b, mix & 2 ? a : other, mix & 4 ? a : mix & 8 ? b : other];
        const proposed = { frontmatter: front.frontmatter, intro: intro.intro, steps: steps.steps };
        const found = places({ before: a, revised: b }, b, proposed);
        // The head of the sheet and the orders of lists and steps are told by the examples above.
        expect(found.filter((place) => /[.:]|^intro$/.test(place)).sort()).toEqual(expected(a, b, proposed));
      }),
      { numRuns: 300 },
    );
  });

  it('never tells more than was changed by both, and tells each place once', () => {
    fc.assert(
      fc.property(three, ([[a, b], c]) => {
        const found = places({ before: a, revised: b }, b, c);
        expect(new Set(found).size).toBe(found.length);
        const [first, second] = [compareProcedures(a, b), compareProcedures(b, c)];
        for (const place of found.filter((one) => one.includes('.'))) {
          expect(first.values.map(({ path }) => path)).toContain(place);
          expect(second.values.map(({ path }) => path)).toContain(place);
        }
      }),
    );
  });
});
