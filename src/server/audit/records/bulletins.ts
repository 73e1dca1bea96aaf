import { recordCheck } from './record';

const COMMON = 'e.seq, e.at, e.detail, t.id, p.number, NULL AS letter';
const KINDS = `CASE e.act WHEN 'procedure.withdrawn' THEN 'withdrawn' ELSE 'brought back' END`;
const SAID = `json_extract(t.words, '$[0]') = json_extract(e.detail, '$.reason')`;

/** Withdrawals and bringings back with their reasons; and of a critical change, that whoever published it tells of it. */
export const bulletins = recordCheck({
  table: 'bulletins',
  spoken: (entries) => `SELECT ${COMMON} FROM auditEntries e JOIN procedures p ON p.id = e.subjectId
    LEFT JOIN bulletins t ON t.procedureId = p.id AND t.kind = ${KINDS} AND t.byId = e.actorId AND ${SAID} AND t.at <= e.at
    WHERE e.subjectType = 'procedure' AND e.act IN ('procedure.withdrawn', 'procedure.brought-back') AND ${entries}
    GROUP BY e.seq`,
  differs: () => [],
  unspoken: (rows) => `SELECT t.id, p.number, r.letter FROM bulletins t
      JOIN procedures p ON p.id = t.procedureId JOIN revisions r ON r.id = t.revisionId
    WHERE ${rows} AND NOT EXISTS (SELECT 1 FROM auditEntries e WHERE e.actorId = t.byId AND CASE t.kind
      WHEN 'critical change' THEN e.subjectId = t.revisionId AND e.act = 'revision.published'
      ELSE e.subjectId = t.procedureId AND e.act IN ('procedure.withdrawn', 'procedure.brought-back')
        AND ${KINDS} = t.kind AND ${SAID} END)`,
});

/** Who has read and signed. */
export const signatures = recordCheck({
  table: 'readAndSigned',
  spoken: (entries) => `SELECT e.seq, e.at, e.detail, t.id, p.number, r.letter FROM auditEntries e
    LEFT JOIN bulletins b ON b.id = e.subjectId LEFT JOIN procedures p ON p.id = b.procedureId
    LEFT JOIN revisions r ON r.id = b.revisionId
    LEFT JOIN readAndSigned t ON t.bulletinId = e.subjectId AND t.personId = e.actorId
    WHERE e.subjectType = 'bulletin' AND e.act = 'bulletin.signed' AND ${entries}`,
  differs: () => [],
  unspoken: (rows) => `SELECT t.id, p.number, r.letter FROM readAndSigned t JOIN bulletins b ON b.id = t.bulletinId
      JOIN procedures p ON p.id = b.procedureId JOIN revisions r ON r.id = b.revisionId
    WHERE ${rows} AND NOT EXISTS (SELECT 1 FROM auditEntries e
      WHERE e.subjectId = t.bulletinId AND e.act = 'bulletin.signed' AND e.actorId = t.personId)`,
});
