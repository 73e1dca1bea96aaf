import type { Fault } from '@/domain/audit/fault';
import { app } from '../../context';
import { bulletins, signatures } from './bulletins';
import { standingFaults } from './procedures';
import { faultOf, type RecordCheck, type Scope, type Spoken } from './record';
import { agreements, overrides, remarks } from './reviews';
import { published, written } from './revisions';

/** Every kind of row that the trail speaks of. A new one adds its check here. */
const CHECKS: readonly RecordCheck[] = [published, written, agreements, overrides, remarks, bulletins, signatures];

/** Entries whose row is gone or says something else. */
export async function spokenFaults(entries: string, replacements: Scope['replacements']): Promise<Fault[]> {
  const { db } = await app();
  const faults: Fault[] = [];
  for (const check of CHECKS) {
    const rows = await db.read<Spoken>(check.spoken(entries), replacements);
    for (const row of rows) faults.push(...faultOf(check, row));
  }
  return faults;
}

/** Rows that no entry speaks of, and procedures that do not stand as the trail says. */
export async function unspokenFaults(rows: string, replacements: Scope['replacements']): Promise<Fault[]> {
  const { db } = await app();
  const faults: Fault[] = [];
  for (const { table, unspoken } of CHECKS) {
    if (!unspoken) continue;
    const found = await db.read<{ id: string; number: string; letter: string | null }>(unspoken(rows), replacements);
    faults.push(
      ...found.map((row) => ({ table, ...row, at: null, differs: ['is there, but the trail does not tell of it'] })),
    );
  }
  return [...faults, ...(await standingFaults(rows.replaceAll('r.procedureId', 'p.id'), replacements))];
}
