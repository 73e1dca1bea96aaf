import { createHash, randomBytes } from 'node:crypto';
import type { Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import { now } from '../clock';
import { app } from '../context';
import { conflict, notFound } from '../refusal';
import { mayHaveFeed, type FeedShop } from './places';

/** 256 bits, as many as SHA-256 keeps; so the hash needs no salt and no slow function. */
const KEY_BYTES = 32;

export const keyHashOf = (key: string): string => createHash('sha256').update(key, 'utf8').digest('hex');

/** A feed that a person may have: where its key was made, when; without `madeAt` there is none. */
export interface FeedStanding {
  shopId: FeedShop;
  /** "Common book and Northgate Engine Works". */
  name: string;
  madeAt: string | null;
}

/** The feeds a person may have now, each with how it stands: one a shop, or the common book's for whoever has no shop. */
export async function listFeeds(actor: Actor): Promise<FeedStanding[]> {
  const { db } = await app();
  const shops = [...new Set(actor.memberships.flatMap((m) => (m.in === 'shop' ? [m.shopId] : [])))];
  const names = await db.read<{ id: string; name: string }>(
    'SELECT id, name FROM shops WHERE id IN (:shops) ORDER BY name',
    {
      shops,
    },
  );
  const rows = await db.read<{ shopId: FeedShop; madeAt: string }>(
    'SELECT shopId, madeAt FROM feedKeys WHERE personId = :personId AND keyHash IS NOT NULL',
    { personId: actor.personId },
  );
  const madeAt = (shopId: FeedShop) => rows.find((row) => row.shopId === shopId)?.madeAt ?? null;
  const ofShops = names.map(({ id, name }) => ({ shopId: id, name: `Common book and ${name}`, madeAt: madeAt(id) }));
  const common = ofShops.length === 0 || madeAt(null) !== null;
  const feeds = common ? [{ shopId: null, name: 'Common book', madeAt: madeAt(null) }, ...ofShops] : ofShops;
  return feeds.filter(({ shopId }) => mayHaveFeed(actor, shopId));
}

const MEANWHILE =
  'The address was changed since this page was opened, perhaps by the same button. Nothing was done. If you do not have the present one, make a new one.';

/**
 * Makes the key of a feed, in place of one there may be, and answers it; it is never told again.
 *
 * @param standing when the key was made that the person saw, null where they saw none; 409 where another stands now, so
 *   that a page loaded again does not take away the key it showed. Refuses 404 a shop the person has no role in.
 */
export async function makeFeedKey(actor: Actor, shopId: FeedShop, standing: string | null): Promise<string> {
  const key = randomBytes(KEY_BYTES).toString('base64url');
  await change(actor, shopId, standing, keyHashOf(key));
  return key;
}

/** Ends the key of a feed; the address answers 404 from now on. Refuses as `makeFeedKey` does. */
export const revokeFeedKey = (actor: Actor, shopId: FeedShop, standing: string): Promise<void> =>
  change(actor, shopId, standing, null);

async function change(actor: Actor, shopId: FeedShop, standing: string | null, keyHash: string | null): Promise<void> {
  if (!mayHaveFeed(actor, shopId)) throw notFound();
  const { db } = await app();
  const { personId } = actor;
  await db.write(async () => {
    const { FeedKey } = db.models;
    const found = await FeedKey.findOne({ where: { personId, shopId } });
    if ((found?.keyHash ? found.madeAt : null) !== standing) throw conflict(MEANWHILE);
    // Within one millisecond of the last, the time would not tell the two keys apart.
    const madeAt = found?.madeAt === now() ? new Date(Date.parse(now()) + 1).toISOString() : now();
    const row = found
      ? await found.update({ keyHash, ...(keyHash && { madeAt }) })
      : await FeedKey.create({ personId, shopId, keyHash, madeAt });
    const act = keyHash === null ? 'feed.revoked' : standing === null ? 'feed.made' : 'feed.replaced';
    await appendAudit({ actorId: personId, act, subject: { type: 'feed', id: row.id }, shopId });
  });
}
