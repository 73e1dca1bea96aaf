import { changeWords, type BulletinKind } from '@/domain/bulletins/bulletin';
import { now } from '../clock';
import { app } from '../context';

interface Cause {
  procedureId: string;
  shopId: string | null;
  revisionId: string;
  byId: string;
}

/** Writes a bulletin. Call it inside the `write` that does what it tells of; its revision is the published one then. */
export async function writeBulletin(kind: BulletinKind, words: string[], cause: Cause, at = now()): Promise<void> {
  const { procedureId, shopId, revisionId, byId } = cause;
  const { db } = await app();
  await db.models.Bulletin.create({ kind, words, procedureId, shopId, revisionId, byId, at });
}

/** Tells every reader of the book of a critical change. Call it inside the `write` that publishes, once it is current. */
export async function tellOfChange({
  told,
  supersedes,
  ...cause
}: Cause & { told: readonly string[]; supersedes: string | null }): Promise<void> {
  const words = changeWords(told, supersedes);
  if (words) await writeBulletin('critical change', words, cause);
}
