import { differences } from '@/domain/audit/differences';
import type { Fault } from '@/domain/audit/fault';
import { app } from '../../context';

interface Row {
  id: string;
  number: string;
  letter: string | null;
  lastLetter: string | null;
  withdrawn: 0 | 1;
  lastAct: string | null;
}

/** Which revision of a procedure is the one to work from, and whether it is withdrawn, by the last word of the trail. */
export async function standingFaults(rows: string, replacements: Record<string, unknown>): Promise<Fault[]> {
  const { db } = await app();
  const found = await db.read<Row>(
    `SELECT p.id, p.number, c.letter, p.withdrawnAt IS NOT NULL AS withdrawn,
       (SELECT json_extract(e.detail, '$.letter') FROM revisions l JOIN auditEntries e ON e.subjectId = l.id
        WHERE l.procedureId = p.id AND l.letter IS NOT NULL AND e.act = 'revision.published' ORDER BY e.seq DESC LIMIT 1) AS lastLetter,
       (SELECT e.act FROM auditEntries e WHERE e.subjectId = p.id
          AND e.act IN ('procedure.withdrawn', 'procedure.brought-back') ORDER BY e.seq DESC LIMIT 1) AS lastAct
     FROM procedures p LEFT JOIN revisions c ON c.id = p.currentRevisionId
     WHERE ${rows} AND (c.letter IS NOT lastLetter OR withdrawn <> (lastAct IS 'procedure.withdrawn'))`,
    replacements,
  );
  return found.map(({ id, number, letter, lastLetter, withdrawn, lastAct }) => ({
    table: 'procedures',
    id,
    at: null,
    number,
    letter: null,
    differs: [
      ...differences({ 'current revision': [letter, lastLetter] }),
      ...(withdrawn === 1 && lastAct !== 'procedure.withdrawn'
        ? ['is withdrawn, but the trail says that it is in use']
        : withdrawn === 0 && lastAct === 'procedure.withdrawn'
          ? ['is in use, but the trail says that it was withdrawn']
          : []),
    ],
  }));
}
