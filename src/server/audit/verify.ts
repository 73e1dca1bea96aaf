import type { Break } from '@/domain/audit/chain';
import { followChain } from './walk';

export type Verified = { ok: true; entries: number } | { ok: false; seq: number; why: string };

const WHY: Record<Break['kind'], string> = {
  missing: 'An entry is missing.',
  replaced: 'The entry after it does not follow from it.',
  changed: 'It was changed after it was written.',
};

/** Reads the trail from its start and tells where the chain first breaks; says nothing of the rows that it speaks of. */
export async function verifyAudit(): Promise<Verified> {
  const { entries, breaks } = await followChain();
  const [first] = breaks;
  return first ? { ok: false, seq: first.seq, why: WHY[first.kind] } : { ok: true, entries };
}
