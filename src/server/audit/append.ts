import { createHash } from 'node:crypto';
import { now } from '../clock';
import { app } from '../context';

export interface Act {
  /** Null where the system itself acts, for example the import of a release. */
  actorId: string | null;
  /** What was done, in the words of the product: `proposal.submitted`, `revision.published`. */
  act: string;
  subject: {
    type: 'procedure' | 'revision' | 'person' | 'shop' | 'membership' | 'book' | 'flag' | 'bulletin' | 'feed' | 'photo';
    id: string;
  };
  /** The shop it concerns; left out for the common book and the network. */
  shopId?: string | null;
  detail?: Record<string, unknown>;
}

export interface ChainedEntry {
  at: string;
  actorId: string | null;
  act: string;
  subjectType: string;
  subjectId: string;
  shopId: string | null;
  /** JSON text, exactly as stored. */
  detail: string;
  previousHash: string;
}

/** SHA-256, hex, over the entry and the hash of the one before it. The order of the fields is part of it. */
export const entryHash = (e: ChainedEntry): string =>
  createHash('sha256')
    .update(
      JSON.stringify([e.previousHash, e.at, e.actorId, e.act, e.subjectType, e.subjectId, e.shopId, e.detail]),
      'utf8',
    )
    .digest('hex');

/** Adds an entry to the trail. Call it inside the `write` that does the act, so that both are stored or neither. */
export async function appendAudit({ actorId, act, subject, shopId = null, detail = {} }: Act): Promise<void> {
  const { db } = await app();
  await db.write(async () => {
    const [last] = await db.read<{ hash: string }>('SELECT hash FROM auditEntries ORDER BY seq DESC LIMIT 1');
    const entry: ChainedEntry = {
      at: now(),
      actorId,
      act,
      subjectType: subject.type,
      subjectId: subject.id,
      shopId,
      detail: JSON.stringify(detail),
      previousHash: last?.hash ?? '',
    };
    await db.models.AuditEntry.create({ ...entry, detail, hash: entryHash(entry) });
  });
}
