import { differences, otherPerson } from '@/domain/audit/differences';
import { recordCheck, type Spoken } from './record';

const JOINS = `FROM auditEntries e LEFT JOIN revisions r ON r.id = e.subjectId LEFT JOIN procedures p ON p.id = r.procedureId`;
const COMMON = 'e.seq, e.at, e.detail, r.id, p.number, r.letter';

interface Published extends Spoken {
  actorId: string;
  actor: string;
  state: string;
  hash: string;
  authorId: string;
  author: string;
  toldAuthorId: string | null;
  toldAuthor: string | null;
  authorKind: 'person' | 'release';
  reason: string;
  publishedAt: string | null;
  current: 0 | 1;
  agreed: 0 | 1;
}

/** Published texts: letter, hash, author, reason, date, who published, and whether it is the one to work from. */
export const published = recordCheck<Published>({
  table: 'revisions',
  spoken: (entries) => `SELECT ${COMMON}, e.actorId, r.state, r.hash, r.authorId, r.reason, r.publishedAt,
      (SELECT name FROM people WHERE id = e.actorId) AS actor, a.name AS author, a.kind AS authorKind,
      t.id AS toldAuthorId, t.name AS toldAuthor,
      p.currentRevisionId IS r.id AS current,
      EXISTS (SELECT 1 FROM agreements g WHERE g.revisionId = r.id AND g.personId = e.actorId AND g.hash = r.hash) AS agreed
    ${JOINS} LEFT JOIN people a ON a.id = r.authorId LEFT JOIN people t ON t.id = json_extract(e.detail, '$.author')
    WHERE e.subjectType = 'revision' AND e.act = 'revision.published' AND ${entries}`,
  differs: (row, told) => [
    ...differences({
      letter: [row.letter, told['letter']],
      hash: [row.hash, told['hash']],
      number: [row.number, told['number']],
      state: [row.state, row.current ? 'published' : 'superseded'],
      reason: [row.reason, told['reason']],
      'day of publication': [row.publishedAt, told['publishedAt']],
    }),
    ...otherPerson({ id: row.authorId, name: row.author }, { id: row.toldAuthorId, name: row.toldAuthor }),
    // A release publishes its own text where the book has not diverged; else an editor does, who has agreed.
    ...(row.agreed || (row.authorKind === 'release' && row.actorId === row.authorId)
      ? []
      : [`has no agreement of ${row.actor}, who published it`]),
  ],
  unspoken: (rows) => `SELECT r.id, p.number, r.letter FROM revisions r JOIN procedures p ON p.id = r.procedureId
    WHERE r.state IN ('published', 'superseded') AND ${rows} AND NOT EXISTS (SELECT 1 FROM auditEntries e
      WHERE e.subjectId = r.id AND e.subjectType = 'revision' AND e.act = 'revision.published')`,
});

interface Written extends Spoken {
  act: string;
  authorId: string;
  author: string;
  actorId: string;
  actor: string;
}

/** Who wrote a text: whoever started and sent it in. */
export const written = recordCheck<Written>({
  table: 'revisions',
  spoken: (entries) => `SELECT ${COMMON}, e.act, r.authorId, e.actorId,
      (SELECT name FROM people WHERE id = r.authorId) AS author, (SELECT name FROM people WHERE id = e.actorId) AS actor
    ${JOINS} WHERE e.subjectType = 'revision' AND e.act IN ('proposal.started', 'proposal.submitted') AND ${entries}`,
  mayBeGone: ({ act }) => act === 'proposal.started',
  differs: (row) => otherPerson({ id: row.authorId, name: row.author }, { id: row.actorId, name: row.actor }),
});
