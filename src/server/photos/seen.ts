import type { Photo } from '@/domain/api/schemas/photos';
import { readsFlag } from '@/domain/flags/flags';
import { may, type Actor } from '@/domain/people/may';
import type { PhotoSubject } from '@/domain/photos/photos';
import { subjectOf } from '@/domain/review/rules';
import { app } from '../context';
import { loadFlag } from '../flags/rows';
import { notFound } from '../refusal';
import { loadProposal, type Loaded } from '../review/proposals';
import { isUnsent, photosOf, type Hanging } from './load';

/** A photo that somebody may see, with what it hangs on. */
export interface Seen {
  id: string;
  bytes: number;
  hash: string;
  uploaderId: string;
  /** Null while it was not sent with anything. */
  on: {
    type: PhotoSubject;
    id: string;
    hanging: Hanging;
    /** For the audit trail. */
    number: string;
    shopId: string | null;
    /** Page on which it stands. */
    href: string;
  } | null;
  removed: boolean;
}

interface Row {
  id: string;
  uploaderId: string;
  subjectType: PhotoSubject | null;
  subjectId: string | null;
  threadId: string | null;
  revisionId: string | null;
  bytes: number;
  hash: string;
  attachedAt: string | null;
  removedAt: string | null;
}

export const draftOf = ({ state, proposedAt }: Pick<Loaded, 'state' | 'proposedAt'>): Pick<Hanging, 'draft'> =>
  state === 'draft' || state === 'returned' ? { draft: { proposedAt } } : {};

async function onProposal(actor: Actor, row: Row, proposalId: string): Promise<Seen['on']> {
  const proposal = await loadProposal(proposalId);
  if (!proposal || !may(actor, 'readProposal', subjectOf(proposal.facts)).ok) throw notFound();
  const { number, shopId, facts } = proposal;
  const message = row.subjectType === 'message';
  return {
    type: message ? 'message' : 'proposal',
    id: row.subjectId ?? '',
    hanging: { book: facts.book, ...(message ? {} : draftOf(proposal)) },
    number,
    shopId,
    href: `/proposals/${proposalId}${message ? `#thread-${row.threadId ?? ''}` : ''}`,
  };
}

/** Each kind of thing that takes photos says who sees it; to add one is to add a line here. */
async function on(actor: Actor, row: Row): Promise<Seen['on']> {
  switch (row.subjectType) {
    case null:
      if (row.uploaderId !== actor.personId) throw notFound();
      return null;
    case 'message':
      return onProposal(actor, row, row.revisionId ?? '');
    case 'proposal':
      return onProposal(actor, row, row.subjectId ?? '');
    case 'flag': {
      const flag = await loadFlag(row.subjectId ?? '');
      if (!flag || !readsFlag(actor, flag.facts)) throw notFound();
      const { view, facts } = flag;
      const href = `/flags#flag-${view.id}`;
      return {
        type: 'flag',
        id: view.id,
        hanging: { book: facts.book },
        number: view.number,
        shopId: view.book.shopId,
        href,
      };
    }
  }
}

/** The photo, if this person may see what it hangs on; 404 for an unknown and an unseen one alike. */
export async function seenPhoto(actor: Actor, id: string): Promise<Seen> {
  const { db } = await app();
  const [row] = await db.read<Row>(
    `SELECT t.id, t.uploaderId, t.subjectType, t.subjectId, t.bytes, t.hash, t.attachedAt, t.removedAt, m.threadId, h.revisionId
     FROM attachments t LEFT JOIN threadMessages m ON t.subjectType = 'message' AND m.id = t.subjectId
       LEFT JOIN threads h ON h.id = m.threadId WHERE t.id = :id`,
    { id },
  );
  if (!row) throw notFound();
  const { bytes, hash, uploaderId } = row;
  const thing = await on(actor, row);
  if (thing && uploaderId !== actor.personId && isUnsent(row.attachedAt ?? '', thing.hanging)) throw notFound();
  return { id: row.id, bytes, hash, uploaderId, on: thing, removed: row.removedAt !== null };
}

/** A photo that was sent, as pages and API show it. Refuses 404 also one that was not sent. */
export async function readPhoto(actor: Actor, id: string): Promise<{ photo: Photo; seen: Seen; href: string }> {
  const seen = await seenPhoto(actor, id);
  if (!seen.on) throw notFound();
  const { type, id: subjectId, hanging, href } = seen.on;
  const all = (await photosOf(actor, type, [subjectId], () => hanging))(subjectId);
  const photo = all.find((one) => one.id === id);
  if (!photo) throw notFound();
  return { photo, seen, href };
}
