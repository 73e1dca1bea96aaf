import type { Link } from '@/domain/audit/chain';
import type { Fault } from '@/domain/audit/fault';
import { now } from '../clock';
import { keepCheckpoint, readCheckpoint, tailFaults, type Checkpoint, numbersGiven } from './checkpoint';
import { remember, unlike } from './known';
import { spokenFaults, unspokenFaults } from './records/all';
import { allTextFaults } from './records/texts';
import { followChain, named } from './walk';

export interface AuditReport {
  entries: number;
  /** The last entry; its hash holds all that came before. */
  end: Link;
  /** Revisions whose text was hashed. */
  texts: number;
  faults: Fault[];
  /** Milliseconds. */
  took: number;
}

/** What a check goes by beyond the book itself. */
export interface CheckOptions {
  /** Count and hash (or its first digits) that were written down elsewhere. */
  expected?: Pick<Checkpoint, 'entries' | 'hash'> | undefined;
  /** Takes the trail as it stands for what is known from now on: after a backup was put back. */
  forgetCheckpoint?: boolean;
}

/**
 * Follows the whole trail, then holds every row that it speaks of against it, both ways, and every stored text against its
 * hash. Reads in small parts, so that the book can be used meanwhile. Keeps a checkpoint where nothing is wrong.
 */
export async function checkBook({ expected, forgetCheckpoint = false }: CheckOptions = {}): Promise<AuditReport> {
  const from = performance.now();
  const wholeAt = now();
  const faults: Fault[] = [];
  // Asked first: what is added while the trail is followed must not look as if it had been cut off.
  const given = await numbersGiven();
  const seen = forgetCheckpoint ? null : await readCheckpoint();
  const { end, entries, breaks } = await followChain(undefined, async (rows) => {
    const [first, last] = [rows[0]?.seq ?? 0, rows.at(-1)?.seq ?? 0];
    faults.push(...(await spokenFaults('e.seq BETWEEN :first AND :last', { first, last })));
  });
  faults.unshift(...(await named(breaks)));
  faults.push(...(await tailFaults(end, { given, expected: seen })));
  if (expected) faults.push(...(await tailFaults(end, { given: 0, expected })));
  faults.push(...(await unspokenFaults('1', {})));
  const texts = await allTextFaults();
  const found = unlike([...faults, ...texts.faults]);
  await remember({ end, faults: found, wholeAt });
  if (found.length === 0) await keepCheckpoint(end);
  return { entries, end, texts: texts.texts, faults: found, took: performance.now() - from };
}
