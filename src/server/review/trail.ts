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

/** What became of proposals since each was first sent in, oldest first, as the audit trail has it. Saved drafts stay the author's. */
export async function trailsOf(ids: readonly string[]): Promise<Map<string, TrailEntry[]>> {
  const trails = new Map<string, TrailEntry[]>(ids.map((id) => [id, []]));
  if (ids.length === 0) return trails;
  const { db } = await app();
  const rows = await db.read<{ id: string; act: string; at: string; person: string }>(
    `SELECT e.subjectId AS id, e.act, e.at, ${personColumn('a')} AS person FROM auditEntries e JOIN people a ON a.id = e.actorId
     WHERE e.subjectType = 'revision' AND e.subjectId IN (:ids) AND e.act IN (:acts) ORDER BY e.seq`,
    { ids, acts: Object.keys(WORDS) },
  );
  for (const { id, act, at, person } of rows) {
    const what = WORDS[act];
    if (what) trails.get(id)?.push({ what, at, person: personRef(person) });
  }
  return trails;
}

/** The same of one proposal. */
export const trailOf = async (id: string): Promise<TrailEntry[]> => (await trailsOf([id])).get(id) ?? [];
