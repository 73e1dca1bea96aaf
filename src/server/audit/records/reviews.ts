import { differences } from '@/domain/audit/differences';
import { recordCheck, type Spoken } from './record';

const told = (name: string) => `json_extract(e.detail, '$.${name}')`;
const ON_REVISION = `JOIN revisions r ON r.id = e.subjectId JOIN procedures p ON p.id = r.procedureId`;
const OF_ROW = `JOIN revisions r ON r.id = t.revisionId JOIN procedures p ON p.id = r.procedureId`;
const noEntry = (act: string, same: string) => `NOT EXISTS (SELECT 1 FROM auditEntries e
    WHERE e.subjectId = t.revisionId AND e.subjectType = 'revision' AND e.act ${act} AND e.actorId = t.personId AND ${same})`;
const COMMON = 'e.seq, e.at, e.detail, t.id, p.number, r.letter';

/** Who agreed to which text on which base. */
const AGREED = `t.hash = ${told('hash')} AND t.base IS ${told('base')}`;
export const agreements = recordCheck({
  table: 'agreements',
  spoken: (entries) => `SELECT ${COMMON} FROM auditEntries e ${ON_REVISION}
    LEFT JOIN agreements t ON t.revisionId = r.id AND t.personId = e.actorId AND ${AGREED}
    WHERE e.subjectType = 'revision' AND e.act = 'proposal.agreed' AND ${entries}`,
  differs: () => [],
  unspoken: (rows) => `SELECT t.id, p.number, r.letter FROM agreements t ${OF_ROW}
    WHERE ${rows} AND ${noEntry(`= 'proposal.agreed'`, AGREED)}`,
});

/** Which failed clamp check was overridden, and why. */
const OVERRIDDEN = `t.hash = ${told('hash')} AND t.torqueKey = ${told('torque')}`;
export const overrides = recordCheck<Spoken & { reason: string; share: number }>({
  table: 'clampOverrides',
  spoken: (entries) => `SELECT ${COMMON}, t.reason, t.share FROM auditEntries e ${ON_REVISION}
    LEFT JOIN clampOverrides t ON t.revisionId = r.id AND t.personId = e.actorId AND ${OVERRIDDEN}
    WHERE e.subjectType = 'revision' AND e.act = 'proposal.overridden' AND ${entries}`,
  differs: (row, { reason, share }) => differences({ reason: [row.reason, reason], share: [row.share, share] }),
  unspoken: (rows) => `SELECT t.id, p.number, r.letter FROM clampOverrides t ${OF_ROW}
    WHERE ${rows} AND ${noEntry(`= 'proposal.overridden'`, OVERRIDDEN)}`,
});

/** Why a text went back or was declined. */
const GIVEN_BACK = `t.text = ${told('reason')} AND t.anchor IS ${told('anchor')}`;
export const remarks = recordCheck({
  table: 'remarks',
  spoken: (entries) => `SELECT ${COMMON} FROM auditEntries e ${ON_REVISION}
    LEFT JOIN remarks t ON t.revisionId = r.id AND t.personId = e.actorId AND 'proposal.' || t.kind = e.act AND ${GIVEN_BACK}
    WHERE e.subjectType = 'revision' AND e.act IN ('proposal.returned', 'proposal.declined') AND ${entries}`,
  differs: () => [],
  unspoken: (rows) => `SELECT t.id, p.number, r.letter FROM remarks t ${OF_ROW}
    WHERE ${rows} AND ${noEntry(`= 'proposal.' || t.kind`, GIVEN_BACK)}`,
});
