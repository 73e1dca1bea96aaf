import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Draft } from '@/domain/writing/draft';
import {
  begun,
  LONGEST,
  MOST_ENTRIES,
  nextUp,
  PAUSE,
  recorded,
  redone,
  undone,
  type History,
} from '@/domain/writing/history';
import { emptyDraft, readDraft } from '@/domain/writing/readDraft';

const sheet = readDraft(readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8'), 'Why')!;
const copy = (draft: Draft): Draft => structuredClone(draft);
type Act = (draft: Draft) => void;
const does = (history: History, act: Act, at: number): History => {
  const next = copy(history.present);
  act(next);
  return recorded(history, next, at);
};
const labels = (history: History) => [nextUp(history).undo?.said ?? null, nextUp(history).redo?.said ?? null];
const all = (history: History, step: (history: History) => History | null): History => {
  let now = history;
  for (let next = step(now); next; next = step(now)) now = next;
  return now;
};

const typed =
  (text: string): Act =>
  (d) =>
    void (d.steps[2]!.body = text);
const small = (): Draft => ({
  ...emptyDraft(),
  steps: ['a', 'b', 'c'].map((id) => ({ id, title: id, cautions: [], body: '' })),
  torques: [{ key: 'bolt', name: 'Bolt', nm: '10' }],
});

/** Anything that the desk can do, on a small draft. */
const act: fc.Arbitrary<Act> = fc.oneof(
  fc.string({ maxLength: 3 }).map(
    (title): Act =>
      (d) =>
        void (d.title = title),
  ),
  fc.string({ maxLength: 3 }).map(
    (reason): Act =>
      (d) =>
        void (d.reason = reason),
  ),
  fc.tuple(fc.nat(4), fc.string({ maxLength: 3 })).map(
    ([i, body]): Act =>
      (d) =>
        void (d.steps[i] && (d.steps[i].body = body)),
  ),
  fc.tuple(fc.nat(4), fc.stringMatching(/^[a-z]{1,3}$/)).map(([i, id]): Act => (d) => {
    const step = d.steps[i];
    // As a step gets the id that it keeps.
    if (step?.id.startsWith('new-step') && !d.steps.some((other) => other.id === id))
      Object.assign(step, { id, title: id });
  }),
  fc.nat(4).map((i): Act => (d) => {
    const id = ['new-step', 'new-step-2', 'new-step-3'].find((one) => !d.steps.some((step) => step.id === one));
    if (id) d.steps.splice(i, 0, { id, title: '', cautions: [], body: '' });
  }),
  fc.nat(4).map(
    (i): Act =>
      (d) =>
        void d.steps.splice(i, 1),
  ),
  fc.tuple(fc.nat(4), fc.nat(4)).map(
    ([i, j]): Act =>
      (d) =>
        void d.steps.splice(j, 0, ...d.steps.splice(i, 1)),
  ),
  fc.constantFrom('10', '12', '15').map(
    (nm): Act =>
      (d) =>
        void (d.torques[0] && (d.torques[0]['nm'] = nm)),
  ),
  fc.constant<Act>((d) => void d.torques.push({ key: `t${d.torques.length}`, name: 'T' })),
  fc.constant<Act>((d) => void d.torques.pop()),
  fc.constant<Act>(() => {}),
);
const timeline = fc.array(fc.tuple(act, fc.integer({ min: 0, max: 4000 })), { maxLength: 40 });

describe('what can be taken back', () => {
  it('is named by what it changed', () => {
    let history = does(begun(sheet), (d) => void d.steps.splice(2, 1), 0);
    history = does(history, (d) => void (d.torques[0]!['nm'] = '11'), 10_000);
    expect(labels(history)).toEqual([`torque ${sheet.torques[0]!['name']} changed`, null]);
    history = undone(history)!;
    expect(labels(history)).toEqual(['step 3 deleted', `torque ${sheet.torques[0]!['name']} changed`]);
    history = undone(history)!;
    expect([labels(history), history.present, undone(history)]).toEqual([[null, 'step 3 deleted'], sheet, null]);
  });

  it('holds typing in one field together until it rests, and nothing else', () => {
    let history = does(begun(sheet), typed('W'), 0);
    history = does(history, typed('Wi'), PAUSE);
    expect(history.done).toHaveLength(1);
    history = does(history, typed('Wip'), 2 * PAUSE + 1);
    expect(history.done).toHaveLength(2);
    history = does(history, (d) => void (d.steps[3]!.body = 'x'), 2 * PAUSE + 2);
    expect(history.done).toHaveLength(3);
    for (const t of [3, 4]) history = does(history, (d) => void d.steps.pop(), 2 * PAUSE + t);
    expect(history.done).toHaveLength(5);
    let long = begun(sheet);
    for (let t = 0; t <= LONGEST + 500; t += 500) long = does(long, typed(`x${t}`), t);
    expect(long.done).toHaveLength(2);
  });

  it('drops what was typed and typed back', () => {
    const history = does(does(begun(sheet), typed('x'), 0), typed(sheet.steps[2]!.body), 100);
    expect(history.done).toEqual([]);
    expect(recorded(history, copy(sheet), 200)).toBe(history);
  });

  it('does not count the id that a new step gets, nor lose what was undone by it', () => {
    let history = does(
      begun(sheet),
      (d) => void d.steps.push({ id: 'new-step', title: '', cautions: [], body: '' }),
      0,
    );
    history = does(history, (d) => void (d.steps.at(-1)!.title = 'Wipe'), 5000);
    history = does(history, (d) => void (d.steps.at(-1)!.title = 'Wipe it'), 10_000);
    history = undone(history)!;
    history = does(history, (d) => void (d.steps.at(-1)!.id = 'wipe'), 11_000);
    const n = sheet.steps.length + 1;
    expect(labels(history)).toEqual([`step ${n} changed`, `step ${n} changed`]);
    expect(redone(history)?.present.steps.at(-1)?.title).toBe('Wipe it');
    expect(all(history, undone).present).toEqual(sheet);
  });

  it('is bounded', () => {
    let history = begun(small());
    for (let i = 0; i < MOST_ENTRIES + 20; i += 1) history = does(history, (d) => void (d.title = `${i}`), i * 10_000);
    expect(history.done).toHaveLength(MOST_ENTRIES);
    expect(all(history, undone).present.title).toBe('19');
  });

  it('gives the start after as many steps back as there are, and the end again after as many forward', () => {
    fc.assert(
      fc.property(timeline, (acts) => {
        const start = small();
        let [history, time] = [begun(start), 0];
        for (const [one, wait] of acts) history = does(history, one, (time += wait));
        const end = history.present;
        const steps = history.done.length;
        const back = all(history, undone);
        expect(back.present).toEqual(start);
        expect([back.done.length, back.undone.length]).toEqual([0, steps]);
        expect(all(back, redone).present).toEqual(end);
      }),
      { numRuns: 400 },
    );
  });

  it('stays true where steps back, forward and new acts are mixed', () => {
    const mixed = fc.array(
      fc.oneof(
        { weight: 3, arbitrary: fc.tuple(act, fc.integer({ min: 0, max: 4000 })) },
        fc.constant('undo' as const),
        fc.constant('redo' as const),
      ),
      { maxLength: 40 },
    );
    fc.assert(
      fc.property(mixed, (moves) => {
        const start = small();
        let [history, time] = [begun(start), 0];
        for (const move of moves) {
          const before = history;
          if (move === 'undo') {
            history = undone(history) ?? history;
            // One step back and one forward is no change at all.
            if (history !== before) expect(redone(history)?.present).toEqual(before.present);
          } else if (move === 'redo') {
            history = redone(history) ?? history;
            if (history !== before) expect(undone(history)?.present).toEqual(before.present);
          } else history = does(history, move[0], (time += move[1]));
          expect(nextUp(history).undo?.said).not.toBe('');
        }
        expect(all(history, undone).present).toEqual(start);
      }),
      { numRuns: 400 },
    );
  });
});
