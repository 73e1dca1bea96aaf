import type { Link } from '@/domain/audit/chain';
import type { Fault } from '@/domain/audit/fault';
import { app, type App } from '../context';
import { followChain, named } from './walk';

/** What is known of the trail of a book that is open. */
export interface Known {
  /** The last entry that was looked at. */
  end: Link;
  /** What was found, by the last full check and since. */
  faults: Fault[];
  /** When all of it was last followed from its first entry; ISO 8601 in UTC. */
  wholeAt: string;
}

// By the open database: tests open several in one process.
const held = new WeakMap<App['db'], Known>();
const walking = new WeakMap<App['db'], Promise<Known>>();

export async function remember(known: Known): Promise<void> {
  held.set((await app()).db, known);
}

/** What is known without looking; null before the first look. */
export async function lastKnown(): Promise<Known | null> {
  return held.get((await app()).db) ?? null;
}

async function look(): Promise<Known> {
  const { db } = await app();
  const before = held.get(db);
  if (!before) {
    const at = new Date().toISOString();
    const { end, breaks } = await followChain();
    const known = { end, faults: await named(breaks), wholeAt: at };
    held.set(db, known);
    return known;
  }
  const { end: last } = before;
  const [row] = await db.read<{ hash: string }>('SELECT hash FROM auditEntries WHERE seq = :seq', { seq: last.seq });
  // The entry that all was followed up to is another now, or gone: everything before it is looked at again.
  if (last.seq > 0 && row?.hash !== last.hash) {
    const { end, breaks } = await followChain();
    const under = row ? await named([{ kind: 'changed', seq: last.seq }]) : [cutOff(end.seq, last.seq)];
    const known = {
      end,
      faults: unlike([...before.faults, ...(await named(breaks)), ...under]),
      wholeAt: new Date().toISOString(),
    };
    held.set(db, known);
    return known;
  }
  const { end, breaks } = await followChain(last);
  const known = { ...before, end, faults: unlike([...before.faults, ...(await named(breaks))]) };
  held.set(db, known);
  return known;
}

const cutOff = (end: number, seen: number): Fault => ({
  table: 'auditEntries',
  id: 'end',
  at: null,
  number: null,
  letter: null,
  differs: [`ends at entry ${end}, but it had ${seen} while the book was open: its end was cut off`],
});

/** Each fault once, however often it was found. */
export const unlike = (faults: readonly Fault[]): Fault[] => [
  ...new Map(faults.map((fault) => [JSON.stringify([fault.table, fault.id, fault.differs]), fault])).values(),
];

/** Follows the trail from where it was last known to hold; a few reads however long it is. Two callers at once share one walk. */
export async function knownTrail(): Promise<Known> {
  const { db } = await app();
  const running = walking.get(db);
  if (running) return running;
  const walk = look().finally(() => walking.delete(db));
  walking.set(db, walk);
  return walk;
}
