import type { TrailEntry } from '@/domain/api/schemas/proposals';
import { personColumn, personRef } from '../book/columns';
import { app } from '../context';

const WORDS: Record<string, TrailEntry['what']> = {
  'proposal.submitted': 'proposed',
  'proposal.returned': 'returned',
  'proposal.declined': 'declined',
  'proposal.agreed': 'agreed',
  'proposal.overridden': 'overrode',
  'revision.published': 'published',
};

/** What became of a proposal since it was first sent in, oldest first, as the audit trail has it. Saved drafts stay the author's. */
export async function trailOf(id: string): Promise<TrailEntry[]> {
  const { db } = await app();
  const rows = await db.read<{ act: string; at: string; person: string }>(
    `SELECT e.act, e.at, ${personColumn('a')} AS person FROM auditEntries e JOIN people a ON a.id = e.actorId
     WHERE e.subjectType = 'revision' AND e.subjectId = :id AND e.act IN (:acts) ORDER BY e.seq`,
    { id, acts: Object.keys(WORDS) },
  );
  return rows.flatMap(({ act, at, person }) => {
    const what = WORDS[act];
    return what ? [{ what, at, person: personRef(person) }] : [];
  });
}
