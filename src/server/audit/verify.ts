import { app } from '../context';
import { entryHash, type ChainedEntry } from './append';

export type Verified = { ok: true; entries: number } | { ok: false; seq: number; why: string };

/** Reads the trail from its start and tells where the chain first breaks. */
export async function verifyAudit(): Promise<Verified> {
  const { db } = await app();
  let previous = '';
  let seq = 0;
  for (;;) {
    const rows = await db.read<ChainedEntry & { seq: number; hash: string }>(
      `SELECT seq, at, actorId, act, subjectType, subjectId, shopId, detail, previousHash, hash
       FROM auditEntries WHERE seq > :seq ORDER BY seq LIMIT 1000`,
      { seq },
    );
    if (rows.length === 0) return { ok: true, entries: seq };
    for (const row of rows) {
      // Numbers are given one by one and never again, so a gap is an entry taken out.
      if (row.seq !== seq + 1) return { ok: false, seq: seq + 1, why: 'An entry is missing.' };
      if (row.previousHash !== previous)
        return { ok: false, seq: row.seq, why: 'It does not follow from the entry before it.' };
      if (entryHash(row) !== row.hash) return { ok: false, seq: row.seq, why: 'It was changed after it was written.' };
      previous = row.hash;
      seq = row.seq;
    }
  }
}
