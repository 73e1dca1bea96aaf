import type { Photo } from '@/domain/api/schemas/photos';
import type { Actor, Book } from '@/domain/people/may';
import { mayRemove, mayTakeOff, type PhotoSubject, type SentPhoto } from '@/domain/photos/photos';
import { personColumn, personRef } from '../book/columns';
import { now } from '../clock';
import { app } from '../context';
import { photoOf } from './row';

interface Row {
  id: string;
  subjectId: string;
  uploaderId: string;
  width: number;
  height: number;
  bytes: number;
  alt: string;
  at: string;
  attachedAt: string;
  removedBy: string | null;
  removedAt: string | null;
  removedWhy: string | null;
}

/** What the photos of something hang on, as far as the rules ask. */
export interface Hanging {
  book: Book;
  /** Of a reason: when it was last sent in, null for never; what was put to it since then is unsent. Left out for anything else. */
  draft?: { proposedAt: string | null };
}

/** Put to a reason since it was last sent in: nobody but its uploader may see it. */
export const isUnsent = (attachedAt: string, { draft }: Pick<Hanging, 'draft'>): boolean =>
  draft !== undefined && (draft.proposedAt === null || attachedAt > draft.proposedAt);

const factsOf = (row: Row, hanging: Hanging): SentPhoto => ({
  book: hanging.book,
  uploaderId: row.uploaderId,
  attachedAt: row.attachedAt,
  removed: row.removedAt !== null,
  unsent: isUnsent(row.attachedAt, hanging),
});

function view(actor: Actor, row: Row, hanging: Hanging): Photo {
  const { removedBy, removedAt, removedWhy } = row;
  const facts = factsOf(row, hanging);
  const takeOff = mayTakeOff(actor, facts);
  const removed = removedBy !== null && removedAt !== null;
  return {
    ...photoOf(row),
    // What was removed may have been so for what it was called.
    ...(removed ? { alt: '' } : {}),
    at: row.attachedAt,
    removed: removed ? { person: personRef(removedBy), at: removedAt, reason: removedWhy ?? '' } : null,
    may: { takeOff, remove: !takeOff && mayRemove(actor, facts, now()).ok },
  };
}

/**
 * The photos of several things of one kind, by the id of each, in the order in which they were sent. Nobody is asked whether they
 * may see them: who sees the thing sees its photos, but for those that were not sent yet.
 */
export async function photosOf(
  actor: Actor,
  type: PhotoSubject,
  ids: readonly string[],
  hanging: (subjectId: string) => Hanging,
): Promise<(subjectId: string) => Photo[]> {
  const { db } = await app();
  const rows =
    ids.length === 0
      ? []
      : await db.read<Row>(
          `SELECT t.id, t.subjectId, t.uploaderId, t.width, t.height, t.bytes, t.alt, t.at, t.attachedAt, t.removedAt, t.removedWhy,
             (SELECT ${personColumn('a')} FROM people a WHERE a.id = t.removedById) AS removedBy
           FROM attachments t WHERE t.subjectType = :type AND t.subjectId IN (:ids) ORDER BY t.place`,
          { type, ids },
        );
  return (subjectId) =>
    rows
      .filter((row) => row.subjectId === subjectId)
      // What was put to a reason and not sent in yet is its author's alone.
      .filter((row) => row.uploaderId === actor.personId || !isUnsent(row.attachedAt, hanging(subjectId)))
      .map((row) => view(actor, row, hanging(subjectId)));
}
