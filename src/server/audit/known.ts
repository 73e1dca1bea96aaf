import type { Link } from '@/domain/audit/chain';
import type { Fault } from '@/domain/audit/fault';
import { app, type App } from '../context';
import { keepCheckpoint } from './checkpoint';
import { followChain, named } from './walk';

/** What is known of the trail of a book that is open. */
export interface Known {
  /** The last entry that was looked at. */
  end: Link;
  /** What was found, by the last full check and since. */
  faults: Fault[];
  /** When all of it was last followed from its first entry; ISO 8601 in UTC. */
  wholeAt: string;
  /** Whether the rows that it speaks of and its end were checked too, as at start. */
  checked: boolean;
}

// By the open database: tests open several in one process.
const held = new WeakMap<App['db'], Known>();
const walking = new WeakMap<App['db'], Promise<Known>>();
/** When the checkpoint was last moved on, by the wall clock. */
const kept = new WeakMap<App['db'], number>();
const CHECKPOINT_EVERY = 60_000;

/** What a full check found. */
export async function remember(known: Omit<Known, 'checked'>): Promise<void> {
  held.set((await app()).db, { ...known, checked: true });
}

/** What is known without looking; null before the first look. */
export async function lastKnown(): Promise<Known | null> {
  return held.get((await app()).db) ?? null;
}

/** Keeps what a look found, with what a full check that ended meanwhile found. */
function settle(db: App['db'], before: Known | undefined, found: Known): Known {
  const meanwhile = held.get(db);
  const known =
    meanwhile === undefined || meanwhile === before
      ? found
      : {
          end: found.end.seq > meanwhile.end.seq ? found.end : meanwhile.end,
          faults: unlike([...meanwhile.faults, ...found.faults]),
          wholeAt: meanwhile.wholeAt,
          checked: meanwhile.checked || found.checked,
        };
  held.set(db, known);
  return known;
}

/** Follows all of the trail, from its first entry. */
async function fromTheFirst(): Promise<Pick<Known, 'end' | 'faults' | 'wholeAt'>> {
  const wholeAt = new Date().toISOString();
  const { end, breaks } = await followChain();
  return { end, faults: await named(breaks), wholeAt };
}

async function look(): Promise<Known> {
  const { db } = await app();
  const before = held.get(db);
  if (!before) return settle(db, before, { ...(await fromTheFirst()), checked: false });
  const { end: last } = before;
  const [row] = await db.read<{ hash: string }>('SELECT hash FROM auditEntries WHERE seq = :seq', { seq: last.seq });
  // The entry that all was followed up to is another now, or gone: everything before it is looked at again.
  if (last.seq > 0 && row?.hash !== last.hash) {
    const again = await fromTheFirst();
    const under = row ? await named([{ kind: 'changed', seq: last.seq }]) : [cutOff(again.end.seq, last.seq)];
    return settle(db, before, { ...before, ...again, faults: unlike([...before.faults, ...again.faults, ...under]) });
  }
  const { end, breaks } = await followChain(last);
  const faults = breaks.length > 0 ? unlike([...before.faults, ...(await named(breaks))]) : before.faults;
  const known = settle(db, before, { ...before, end, faults });
  await moveCheckpoint(db, known);
  return known;
}

/** A checkpoint moves on only behind a full check that found nothing: it must never hide what it is there to show. */
async function moveCheckpoint(db: App['db'], { checked, faults, end }: Known): Promise<void> {
  if (!checked || faults.length > 0 || Date.now() - (kept.get(db) ?? 0) < CHECKPOINT_EVERY) return;
  kept.set(db, Date.now());
  await keepCheckpoint(end);
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
