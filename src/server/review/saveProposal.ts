import type { SavedProposal } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { checkResult, refuseOverlong } from '../book/check';
import { app } from '../context';
import { invalid } from '../refusal';
import { columnsOf, weigh } from './draftText';
import { guard, readableProposal, staleBase } from './guard';
import type { Loaded } from './proposals';
import { readProposal } from './readProposal';
import { record } from './record';
import { keepVersion } from './versions/keep';

/** What is left out stays as it is. */
export interface Saved {
  source?: string | undefined;
  reason?: string | undefined;
  /** The letter that the text now stands on; it must be the current one. */
  base?: string | undefined;
  /** Which page writes. */
  page?: string | undefined;
}

async function baseIdOf(proposal: Loaded, base: string | undefined): Promise<string | null> {
  if (base === undefined || base === proposal.base) return proposal.parentId;
  const { db } = await app();
  const [found] = await db.read<{ id: string }>(
    'SELECT id FROM revisions WHERE procedureId = :procedureId AND letter = :base',
    { procedureId: proposal.procedureId, base },
  );
  if (!found) {
    const message = `there is no revision ${base}`;
    throw invalid(`${proposal.number} has no revision ${base}.`, [{ path: 'base', message }]);
  }
  if (base !== proposal.current) throw staleBase({ base, current: proposal.current });
  return found.id;
}

/**
 * Saves what the author typed, also while it cannot be read yet: nothing typed is lost, and `check` says
 * what is wrong. Saving what is there already changes nothing.
 *
 * @param version the one the author opened; 409 where another stands now
 */
export async function saveProposal(
  actor: Actor,
  id: string,
  version: number | null,
  change: Saved,
): Promise<SavedProposal> {
  const before = await readableProposal(actor, id);
  guard({ act: 'edit' }, actor, before, version);
  if (change.source !== undefined) refuseOverlong(change.source);
  const parentId = await baseIdOf(before, change.base);
  const text = await weigh(change.source ?? before.source, parentId);
  const { db } = await app();
  await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    guard({ act: 'edit' }, actor, proposal, version ?? before.version);
    const reason = change.reason ?? proposal.reason;
    if (text.source === proposal.source && reason === proposal.reason && parentId === proposal.parentId) return;
    await db.models.Revision.update(
      { ...columnsOf(text), parentId, reason, version: proposal.version + 1 },
      { where: { id } },
    );
    const kind = parentId === proposal.parentId ? 'write' : 'merge';
    const { source } = text;
    const { personId } = actor;
    await keepVersion(proposal, { revisionId: id, kind, personId, source, reason, parentId, page: change.page });
    await record(actor, 'proposal.saved', proposal, { version: proposal.version + 1, hash: text.hash });
  });
  return { ...(await readProposal(actor, id)), check: checkResult(text.parsed) };
}
