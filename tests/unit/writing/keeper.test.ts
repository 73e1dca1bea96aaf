import { describe, expect, it, vi } from 'vitest';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { Refused } from '@/components/writing/api';
import { HeldCopy, type Store } from '@/components/writing/heldCopy';
import { Keeper, type Surroundings } from '@/components/writing/keeper';

const words = (source: string) => ({ source, reason: 'why' });
const refused = (status: number, more: object = {}) =>
  new Refused(status, { type: '', title: '', status, detail: `refused ${status}`, ...more });
const theirs = (source: string, version: number, edit = true) =>
  ({ source, reason: 'why', version, may: { edit }, whyNot: { edit: 'Sent in already.' } }) as unknown as Proposal;

function bench(around: Partial<Surroundings> = {}) {
  const timers: (() => void)[] = [];
  let stored = 3;
  const save = vi.fn(async () => ({ version: (stored += 1) }));
  const held = { write: vi.fn(() => true), clear: vi.fn() };
  const keeper = new Keeper(words('first'), 3, {
    save,
    readTheirs: async () => theirs('theirs', 9),
    held,
    now: () => 1000,
    later: (act) => {
      timers.push(act);
      return () => timers.splice(timers.indexOf(act), 1);
    },
    ...around,
  });
  return { keeper, save, held, timers };
}

describe('keeping a draft', () => {
  it('holds it on the device at once, saves after a pause, then lets the copy go', async () => {
    const { keeper, save, held, timers } = bench();
    keeper.change(words('second'));
    expect(held.write).toHaveBeenCalledWith({ ...words('second'), version: 3, at: 1000 });
    expect([keeper.state.kind, save.mock.calls.length, timers.length]).toEqual(['waiting', 0, 1]);
    await keeper.flush();
    expect(save).toHaveBeenCalledWith(words('second'), 3, false);
    expect(keeper.state).toEqual({ kind: 'kept', at: 1000 });
    expect([keeper.version, keeper.atRisk, held.clear.mock.calls.length]).toEqual([4, false, 1]);
  });

  it('saves what was typed during a save on the version that save returned', async () => {
    let answer = (_: { version: number }) => {};
    const save = vi
      .fn()
      .mockReturnValueOnce(new Promise((resolve) => (answer = resolve)))
      .mockResolvedValue({ version: 5 });
    const { keeper, held } = bench({ save });
    keeper.change(words('second'));
    const done = keeper.flush();
    keeper.change(words('third'));
    answer({ version: 4 });
    expect(await done).toBe(true);
    expect(save.mock.calls).toEqual([
      [words('second'), 3, false],
      [words('third'), 4, false],
    ]);
    expect(held.clear).toHaveBeenCalledTimes(1);
  });

  it('keeps words on the device and tries again without a network', async () => {
    const save = vi.fn().mockRejectedValueOnce(new TypeError('Failed to fetch')).mockResolvedValue({ version: 4 });
    const { keeper, held, timers } = bench({ save });
    keeper.change(words('second'));
    expect(await keeper.flush()).toBe(false);
    expect(keeper.state).toEqual({ kind: 'unreachable', why: 'network', onDevice: true });
    expect([held.clear.mock.calls.length, timers.length, keeper.atRisk]).toEqual([0, 1, true]);
    timers[0]?.();
    await vi.waitFor(() => expect(keeper.state.kind).toBe('kept'));
  });

  it('asks, where another tab saved meanwhile, and loses neither text', async () => {
    const save = vi
      .fn()
      .mockRejectedValueOnce(refused(409, { version: 9 }))
      .mockResolvedValue({ version: 10 });
    const one = bench({ save });
    one.keeper.change(words('mine'));
    expect(await one.keeper.flush()).toBe(false);
    expect(one.keeper.state).toMatchObject({ kind: 'stale', theirs: { source: 'theirs' } });
    expect(await one.keeper.keepMine()).toBe(true);
    expect(save).toHaveBeenLastCalledWith(words('mine'), 9, false);

    const other = bench({ save: vi.fn().mockRejectedValue(refused(409, { version: 9 })) });
    other.keeper.change(words('mine'));
    await other.keeper.flush();
    expect(other.keeper.takeTheirs()).toEqual({ set: words('theirs'), aside: words('mine'), unsaved: true });
    expect([other.keeper.version, other.keeper.state.kind]).toEqual([9, 'kept']);
  });

  it('goes on where its own save arrived and only the answer was lost', async () => {
    const { keeper } = bench({
      save: vi.fn().mockRejectedValue(refused(409, { version: 4 })),
      readTheirs: async () => theirs('mine', 4),
    });
    keeper.change(words('mine'));
    expect(await keeper.flush()).toBe(true);
    expect(keeper.version).toBe(4);
  });

  it('says why a text is refused, and does not send one that is too large', async () => {
    const { keeper, save } = bench();
    keeper.change(words('x'.repeat(70_000)));
    expect(await keeper.flush()).toBe(false);
    expect(keeper.state).toMatchObject({ kind: 'refused', onDevice: true });
    expect(save).not.toHaveBeenCalled();
    keeper.change(words('short again'));
    expect(await keeper.flush()).toBe(true);

    const sentIn = bench({
      save: vi.fn().mockRejectedValue(refused(409, { version: 4 })),
      readTheirs: async () => theirs('other', 4, false),
    });
    sentIn.keeper.change(words('mine'));
    await sentIn.keeper.flush();
    expect(sentIn.keeper.state).toMatchObject({ kind: 'refused', why: 'Sent in already.' });
  });

  it('finds out before anything is typed that the draft was saved elsewhere', async () => {
    const saved = vi.fn();
    const { keeper, save } = bench({ saved });
    await keeper.look();
    expect(keeper.state).toMatchObject({ kind: 'stale', theirs: { source: 'theirs', version: 9 } });
    expect(keeper.takeTheirs()).toEqual({ set: words('theirs'), aside: words('first'), unsaved: false });
    expect([save.mock.calls.length, saved.mock.calls.length]).toEqual([0, 0]);
    // Its own version is nothing new.
    await keeper.look();
    expect(keeper.state.kind).toBe('kept');
  });

  it('looks again while it waits for an answer, and shows the newest', async () => {
    let version = 9;
    const { keeper } = bench({ readTheirs: async () => theirs(`theirs ${version}`, version) });
    await keeper.look();
    version = 10;
    await keeper.look();
    expect(keeper.state).toMatchObject({ kind: 'stale', theirs: { source: 'theirs 10' } });
  });

  it('goes on in silence where the same was saved elsewhere, and says what was sent in', async () => {
    const same = bench({ readTheirs: async () => theirs('first', 7) });
    await same.keeper.look();
    expect([same.keeper.state.kind, same.keeper.version]).toEqual(['kept', 7]);
    const sentIn = bench({ readTheirs: async () => theirs('first, canonical', 4, false) });
    await sentIn.keeper.look();
    expect(sentIn.keeper.state).toMatchObject({ kind: 'refused', why: 'Sent in already.' });
  });

  it('does not look while words wait, nor without a network', async () => {
    const readTheirs = vi.fn().mockRejectedValue(new TypeError('Failed to fetch'));
    const { keeper } = bench({ readTheirs });
    await keeper.look();
    expect(keeper.state.kind).toBe('kept');
    keeper.change(words('second'));
    await keeper.look();
    expect([readTheirs.mock.calls.length, keeper.state.kind]).toEqual([1, 'waiting']);
  });

  it('tells other pages of each version that it saved', async () => {
    const saved = vi.fn();
    const { keeper } = bench({ saved });
    keeper.change(words('second'));
    await keeper.flush();
    expect(saved).toHaveBeenCalledExactlyOnceWith(4);
  });

  it('has nothing to save once everything is typed back', () => {
    const { keeper, held } = bench();
    keeper.change(words('second'));
    keeper.change(words('first'));
    expect([keeper.state.kind, keeper.atRisk, held.clear.mock.calls.length]).toEqual(['kept', false, 1]);
  });
});

describe('the copy on this device', () => {
  function memory(): Store & { map: Map<string, string> } {
    const map = new Map<string, string>();
    return {
      map,
      getItem: (key) => map.get(key) ?? null,
      setItem: (key, value) => void map.set(key, value),
      removeItem: (key) => void map.delete(key),
      key: (i) => [...map.keys()][i] ?? null,
      get length() {
        return map.size;
      },
    };
  }
  const held = (source: string, at: number) => ({ ...words(source), version: 3, at });

  it('gives the newest copy of an earlier page to the next one, and leaves other drafts alone', () => {
    const store = memory();
    new HeldCopy(store, 'a', 'page-1').write(held('old', 1));
    new HeldCopy(store, 'a', 'page-2').write(held('new', 2));
    new HeldCopy(store, 'b', 'page-3').write(held('other draft', 3));
    const mine = new HeldCopy(store, 'a', 'page-4');
    expect(mine.adopt()).toEqual(held('new', 2));
    expect([...store.map.keys()].sort()).toEqual([
      'matchmark:draft:a:page-1',
      'matchmark:draft:a:page-4',
      'matchmark:draft:b:page-3',
    ]);
    mine.clear();
    expect(store.map.size).toBe(2);
  });

  it('says so where the device cannot keep it', () => {
    const full = {
      ...memory(),
      setItem: () => {
        throw new Error('QuotaExceededError');
      },
    };
    expect(new HeldCopy(full, 'a', 'p').write(held('x', 1))).toBe(false);
    expect(new HeldCopy(null, 'a', 'p').write(held('x', 1))).toBe(false);
    expect(new HeldCopy(full, 'a', 'p').adopt()).toBeNull();
  });
});
