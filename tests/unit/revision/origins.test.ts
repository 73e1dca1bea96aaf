import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Frontmatter } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';
import { nextLetter } from '@/domain/revision/letters';
import { byRevision, originGroups } from '@/domain/revision/originView';
import { originsAfter, partsOf, type Origins } from '@/domain/revision/origins';

const KEYS = ['one', 'two', 'three'] as const;
const STEPS = ['a', 'b', 'c', 'd'] as const;

/** A book-keeper of its own: what stands in the text by place, and who last set it. It never compares two texts. */
interface Diary {
  torques: Map<string, { nm: number; tolerance: number | null }>;
  steps: Map<string, { title: string; body: string }>;
  order: string[];
  since: Map<string, string>;
}

type Edit =
  | { do: 'torque'; key: string; nm: number }
  | { do: 'tolerance'; key: string; tolerance: number | null }
  | { do: 'drop torque'; key: string }
  | { do: 'reword'; id: string; body: string }
  | { do: 'retitle'; id: string; title: string }
  | { do: 'drop step'; id: string }
  | { do: 'move'; id: string; to: number };

const key = fc.constantFrom(...KEYS);
const id = fc.constantFrom(...STEPS);
const edit: fc.Arbitrary<Edit> = fc.oneof(
  fc.record({ do: fc.constant('torque' as const), key, nm: fc.integer({ min: 5, max: 8 }) }),
  fc.record({ do: fc.constant('tolerance' as const), key, tolerance: fc.constantFrom(null, 1, 2) }),
  fc.record({ do: fc.constant('drop torque' as const), key }),
  fc.record({ do: fc.constant('reword' as const), id, body: fc.constantFrom('Wipe it.', 'Turn it.', 'Hold it.') }),
  fc.record({ do: fc.constant('retitle' as const), id, title: fc.constantFrom('Wipe', 'Turn') }),
  fc.record({ do: fc.constant('drop step' as const), id }),
  fc.record({ do: fc.constant('move' as const), id, to: fc.nat(3) }),
);
const histories = fc.array(fc.array(edit, { maxLength: 4 }), { minLength: 1, maxLength: 12 });

/** Does one edit and writes down what it set. A part is dropped by deleting it from the diary. */
function act(diary: Diary, one: Edit, letter: string): void {
  const { torques, steps, since } = diary;
  const set = (place: string) => since.set(place, letter);
  switch (one.do) {
    case 'torque': {
      const old = torques.get(one.key);
      if (old?.nm === one.nm) return;
      torques.set(one.key, { nm: one.nm, tolerance: old?.tolerance ?? null });
      set(`torques.${one.key}.nm`);
      return;
    }
    case 'tolerance': {
      const old = torques.get(one.key);
      if (!old || old.tolerance === one.tolerance) return;
      old.tolerance = one.tolerance;
      if (one.tolerance === null) since.delete(`torques.${one.key}.tolerance`);
      else set(`torques.${one.key}.tolerance`);
      return;
    }
    case 'drop torque':
      if (!torques.delete(one.key)) return;
      since.delete(`torques.${one.key}.nm`);
      since.delete(`torques.${one.key}.tolerance`);
      return;
    case 'reword':
    case 'retitle': {
      const old = steps.get(one.id);
      const part = one.do === 'reword' ? 'body' : 'title';
      const text = one.do === 'reword' ? one.body : one.title;
      if (!old) {
        steps.set(one.id, { title: 'Begin', body: 'Begin.', [part]: text });
        diary.order.push(one.id);
        set(`step:${one.id}:title`);
        set(`step:${one.id}:body`);
      } else if (old[part] !== text) {
        old[part] = text;
        set(`step:${one.id}:${part}`);
      }
      return;
    }
    case 'drop step':
      if (!steps.delete(one.id)) return;
      diary.order = diary.order.filter((other) => other !== one.id);
      since.delete(`step:${one.id}:title`);
      since.delete(`step:${one.id}:body`);
      return;
    case 'move': {
      const at = diary.order.indexOf(one.id);
      if (at === -1) return;
      diary.order.splice(at, 1);
      diary.order.splice(one.to, 0, one.id);
    }
  }
}

const textOf = ({ torques, steps, order }: Diary): Procedure => ({
  frontmatter: Frontmatter.parse({
    title: 'T',
    summary: 'S',
    system: 'sealing',
    engines: ['tarn-t18f'],
    minutes: 5,
    skill: 'apprentice',
    torques: [...torques].map(([name, { nm, tolerance }]) => ({
      key: name,
      name: `Bolt ${name}`,
      thread: 'M6',
      pitch: 1,
      condition: 'dry',
      nm,
      count: 2,
      ...(tolerance === null ? {} : { tolerance }),
    })),
  }),
  intro: '',
  steps: order.map((one) => ({ id: one, cautions: [], ...steps.get(one)! })),
});

/**
 * Edits that cancel out within one revision (dropped and set again) are no change to whoever reads the published texts,
 * so each revision's edits touch a part once.
 */
const touchOnce = (edits: readonly Edit[]): Edit[] => {
  const seen = new Set<string>();
  return edits.filter((one) => {
    const name = 'key' in one ? one.key : one.id;
    if (seen.has(name)) return false;
    seen.add(name);
    return true;
  });
};

describe('the origin of each part', () => {
  it('is the last revision at which it changed, by a diary of the edits', () => {
    let moved = 0;
    fc.assert(
      fc.property(histories, (history) => {
        const diary: Diary = { torques: new Map(), steps: new Map(), order: [], since: new Map() };
        let before: { text: Procedure; origins: Origins } | null = null;
        let letter: string | null = null;
        for (const edits of history) {
          letter = nextLetter(letter);
          const order = diary.order.join();
          for (const one of touchOnce(edits)) act(diary, one, letter);
          if (order !== diary.order.join()) moved += 1;
          const text = structuredClone(textOf(diary));
          before = { text, origins: originsAfter(before, text, letter) };
        }
        for (const [place, since] of diary.since) expect([place, before!.origins[place]]).toEqual([place, since]);
        // And nothing else is claimed of what the diary does not know.
        const known = (place: string) =>
          !/^torques\.\w+\.(nm|tolerance)$|^step:\w+:(title|body)$/.test(place) || diary.since.has(place);
        expect(Object.keys(before!.origins).every(known)).toBe(true);
      }),
      { numRuns: 400 },
    );
    expect(moved, 'histories that move a step').toBeGreaterThan(50);
  });

  it('says of every part of a first revision that it is its own', () => {
    const text = textOf({
      torques: new Map([['one', { nm: 5, tolerance: 1 }]]),
      steps: new Map([['a', { title: 'Wipe', body: 'Wipe it.' }]]),
      order: ['a'],
      since: new Map(),
    });
    const origins = originsAfter(null, text, 'A');
    expect(new Set(Object.values(origins))).toEqual(new Set(['A']));
    expect(Object.keys(origins).sort()).toEqual([...partsOf(text).keys()].sort());
  });
});

describe('origins as they are shown', () => {
  const text = (nm: number, body = 'Tighten to <Torque of="one" />.'): Procedure => {
    const diary: Diary = {
      torques: new Map([['one', { nm, tolerance: 1 }]]),
      steps: new Map([['a', { title: 'Tighten', body }]]),
      order: ['a'],
      since: new Map(),
    };
    return textOf(diary);
  };

  it('stand under the step that uses the value, the latest first', () => {
    const first = text(10);
    const second = text(12);
    const origins = originsAfter({ text: first, origins: originsAfter(null, first, 'A') }, second, 'B');
    const [step, head] = originGroups(second, origins);
    expect(step).toMatchObject({ step: { id: 'a', number: 1 }, title: 'Tighten' });
    expect(step!.origins[0]).toEqual({
      place: 'torques.one.nm',
      subject: 'Bolt one',
      words: '',
      text: '12 N·m',
      letter: 'B',
    });
    expect(
      byRevision(step!.origins).map(({ letter, subjects }) => [letter, subjects.map(({ subject }) => subject)]),
    ).toEqual([
      ['B', ['Bolt one']],
      ['A', ['The words of this step', 'Bolt one']],
    ]);
    expect(head).toMatchObject({ step: null, title: 'The head of the sheet' });
  });

  it('stand apart where no step uses the value', () => {
    const unused = text(10, 'Tighten it.');
    const groups = originGroups(unused, originsAfter(null, unused, 'A'));
    expect(groups.map(({ title }) => title)).toEqual(['Tighten', 'On the sheet, in no step', 'The head of the sheet']);
  });
});
